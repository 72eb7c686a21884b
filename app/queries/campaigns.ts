import type { CampaignView, MemberView } from '#shared/schemas/campaign'
import type { InstrumentView } from '#shared/schemas/instrument'
import type { RecipeView } from '#shared/schemas/recipe'
import type { StationView } from '#shared/schemas/station'
import type { Page } from '#shared/types/retrieval'

const all = { limit: 500 }
const path = (slug: string, rest = '') => `/api/campaigns/${encodeURIComponent(slug)}${rest}`

export const campaignKeys = {
  list: 'campaigns',
  one: (slug: string) => `campaign:${slug}`,
  part: (slug: string, part: string) => `campaign:${slug}:${part}`,
}

export function useCampaigns() {
  const api = useApi()
  return useAsyncData(campaignKeys.list, () => api<Page<CampaignView>>('/api/campaigns', { query: all }))
}

export function useCampaign(slug: MaybeRefOrGetter<string>) {
  const api = useApi()
  return useAsyncData(() => campaignKeys.one(toValue(slug)), () => api<CampaignView>(path(toValue(slug))))
}

/** Null slug: nothing is asked and the data stay null. */
function useCampaignPart<T>(slug: MaybeRefOrGetter<string | null>, part: string) {
  const api = useApi()
  return useAsyncData(() => campaignKeys.part(toValue(slug) ?? '', part), async () => {
    const name = toValue(slug)
    return name ? (await api<Page<T>>(path(name, `/${part}`), { query: all })).items : []
  }, { default: (): T[] => [] })
}

export const useMembers = (slug: MaybeRefOrGetter<string | null>) => useCampaignPart<MemberView>(slug, 'members')
export const useRecipes = (slug: MaybeRefOrGetter<string | null>) => useCampaignPart<RecipeView>(slug, 'recipes')
export const useStations = (slug: MaybeRefOrGetter<string | null>) => useCampaignPart<StationView>(slug, 'stations')
export const useInstruments = (slug: MaybeRefOrGetter<string | null>) => useCampaignPart<InstrumentView>(slug, 'instruments')
