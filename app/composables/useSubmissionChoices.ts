import { settingsSchema, type RetrievalSettings } from '#shared/schemas/settings'
import type { SettingsPatch } from '#shared/schemas/retrieval-submit'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { may } from '#shared/utils/permissions'
import { useCampaigns, useInstruments, useRecipes, useStations } from '~/queries/campaigns'

/** In the place of a recipe: settings of one's own. */
export const ownSettings = 'own'

/** Nothing is submitted under what is archived. */
const inUse = <T extends { archivedAt: string | null }>(items: Readonly<Ref<T[]>>) => computed(() => items.value.filter(item => !item.archivedAt))

/** Campaign, recipe, station and instrument of a submission, with what they may be. A lone choice is made at once. */
export function useSubmissionChoices() {
  const route = useRoute()
  const asked = typeof route.query.campaign === 'string' ? route.query.campaign : null
  const campaign = ref<string | null>(asked)
  const recipe = ref<string | null>(null)
  const station = ref<string | null>(null)
  const instrument = ref<string | null>(null)
  const own = ref<SettingsPatch>({})

  const campaigns = useCampaigns()
  const recipes = useRecipes(campaign)
  const stations = useStations(campaign)
  const instruments = useInstruments(campaign)

  const open = computed(() => (campaigns.data.value?.items ?? []).filter(item => may(item.role, 'submit') && !item.archivedAt))
  const newest = computed(() => recipes.data.value.filter(item => item.newest && !item.archivedAt))

  watch(open, (list) => { if (!campaign.value && list.length === 1) campaign.value = list[0]!.slug }, { immediate: true })
  watch(campaign, () => { recipe.value = station.value = instrument.value = null })
  watch(newest, (list) => { if (!recipe.value && list.length) recipe.value = list.length === 1 ? list[0]!.address : null }, { immediate: true })
  watch([newest, recipes.status], ([list, status]) => { if (campaign.value && status === 'success' && !list.length) recipe.value = ownSettings }, { immediate: true })

  const settings = computed<RetrievalSettings | null>(() => {
    if (recipe.value === ownSettings) return settingsSchema.safeParse(own.value).data ?? null
    return newest.value.find(item => item.address === recipe.value)?.settings ?? null
  })
  const chosenInstrument = computed(() => instruments.data.value.find(item => item.slug === instrument.value) ?? null)
  /** What the instrument's team has said of all its spectra. */
  const common = computed<Partial<SpectrumAbout>>(() => {
    const { axisUnit, medium, valueKind } = chosenInstrument.value ?? {}
    return { ...(axisUnit ? { axisUnit } : {}), ...(medium ? { medium } : {}), ...(valueKind ? { valueKind } : {}) }
  })
  /** What goes with every file of the submission. */
  const place = computed<Partial<SpectrumAbout>>(() => ({
    ...(station.value ? { station: station.value } : {}), ...(instrument.value ? { instrument: instrument.value } : {}),
  }))
  const request = computed(() => (recipe.value === ownSettings ? { settings: own.value } : { recipe: recipe.value ?? undefined }))

  return { campaign, recipe, station, instrument, own, open, newest, stations: inUse(stations.data), instruments: inUse(instruments.data), status: campaigns.status, error: campaigns.error, settings, common, place, request }
}
