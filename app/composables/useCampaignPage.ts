import type { CampaignAction } from '#shared/types/roles'
import { mayIn } from '#shared/utils/permissions-in-archive'
import { useCampaign } from '~/queries/campaigns'
import { toApiError } from '~/utils/api-error'

/** The campaign that a page is of. A former address leads on to the present one; whoever may not do what the page is for is told. */
export async function useCampaignPage(action: CampaignAction = 'see') {
  const nuxt = useNuxtApp()
  const route = useRoute()
  const slug = String(route.params.slug)
  const { data, error, refresh } = await useCampaign(slug)
  if (error.value && toApiError(error.value).statusCode === 404) throw createError({ statusCode: 404, fatal: true })
  if (data.value && data.value.slug !== slug) await nuxt.runWithContext(() => navigateTo(presentAddress(route, slug, data.value!.slug), { replace: true }))
  if (data.value && !mayIn(data.value, action)) throw createError({ statusCode: 403, message: notYours(data.value), fatal: true })
  return { slug, campaign: data, error, refresh, can: (wanted: CampaignAction) => mayIn(data.value, wanted) }
}

const notYours = ({ archivedAt }: { archivedAt: string | null }) => archivedAt
  ? 'The campaign is archived: it can be read, and nothing in it is changed until its lead brings it back.'
  : 'You may read this campaign, and not change this part of it. Its lead can give you another role.'

const presentAddress = ({ path, query, hash }: { path: string, query: object, hash: string }, former: string, present: string) =>
  ({ path: path.replace(`/campaigns/${former}`, `/campaigns/${present}`), query: { ...query }, hash })
