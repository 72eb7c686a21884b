import type { CampaignForm, CampaignView } from '#shared/schemas/campaign'
import type { InstrumentForm, InstrumentView } from '#shared/schemas/instrument'
import type { RecipeDetail, RecipeForm, RecipeView } from '#shared/schemas/recipe'
import type { StationForm, StationNight, StationView } from '#shared/schemas/station'
import { campaignKeys } from '~/queries/campaigns'

export type ObjectKind = 'stations' | 'instruments' | 'recipes'

const campaignPath = (slug: string, rest = '') => `/api/campaigns/${encodeURIComponent(slug)}${rest}`
const objectPath = (slug: string, kind: ObjectKind, address: string) => campaignPath(slug, `/${kind}/${encodeURIComponent(address)}`)

function useCampaignObject<T>(slug: string, kind: ObjectKind, address: MaybeRefOrGetter<string>) {
  const api = useApi()
  return useAsyncData(() => campaignKeys.part(slug, `${kind}:${toValue(address)}`), () => api<T>(objectPath(slug, kind, toValue(address))))
}

export const useStation = (slug: string, station: string) => useCampaignObject<StationView>(slug, 'stations', station)
export const useInstrument = (slug: string, instrument: string) => useCampaignObject<InstrumentView>(slug, 'instruments', instrument)
export const useRecipe = (slug: string, recipe: MaybeRefOrGetter<string>) => useCampaignObject<RecipeDetail>(slug, 'recipes', recipe)

/** Nights of a station, newest first. */
export function useStationNights(slug: string, station: string) {
  const api = useApi()
  return useLoadMore<StationNight>(() => campaignKeys.part(slug, `stations:${station}:nights`), cursor => api(`${objectPath(slug, 'stations', station)}/nights`, { query: { cursor, limit: 10 } }), night => night.night)
}

/** Making, changing and archiving what a campaign owns, and the campaign itself. */
export function useObjectChanges(slug: string) {
  const api = useApi()
  const send = <T>(method: 'POST' | 'PATCH', path: string, body: object = {}) => api<T>(path, { method, body: { ...body } })
  /** Addresses of equipment and recipes stay, so they are not sent along. */
  const change = <T>(kind: ObjectKind, address: string, { slug: _, ...body }: { slug?: string, version: number }) => send<T>('PATCH', objectPath(slug, kind, address), body)
  const verb = (archived: boolean) => archived ? 'archive' : 'unarchive'
  return {
    createCampaign: (form: CampaignForm) => send<CampaignView>('POST', '/api/campaigns', form),
    changeCampaign: (form: CampaignForm, version: number) => send<CampaignView>('PATCH', campaignPath(slug), { ...form, version }),
    archiveCampaign: (archived: boolean) => send<CampaignView>('POST', campaignPath(slug, `/${verb(archived)}`)),
    createStation: (form: StationForm) => send<StationView>('POST', campaignPath(slug, '/stations'), form),
    changeStation: (address: string, form: StationForm, version: number) => change<StationView>('stations', address, { ...form, version }),
    createInstrument: (form: InstrumentForm) => send<InstrumentView>('POST', campaignPath(slug, '/instruments'), form),
    changeInstrument: (address: string, form: InstrumentForm, version: number) => change<InstrumentView>('instruments', address, { ...form, version }),
    createRecipe: (form: RecipeForm) => send<RecipeView>('POST', campaignPath(slug, '/recipes'), form),
    changeRecipe: (address: string, form: RecipeForm, version: number) => change<RecipeDetail>('recipes', address, { ...form, version }),
    archive: (kind: ObjectKind, address: string, archived: boolean) => send<unknown>('POST', `${objectPath(slug, kind, address)}/${verb(archived)}`),
  }
}
