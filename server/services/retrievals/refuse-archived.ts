import { DomainError } from '#shared/utils/domain-error'
import { findArchivedPlaces } from '../../database/campaigns/repository-equipment'
import { findRecipeById } from '../../database/campaigns/repository-recipes'
import { database } from '../../database/client'
import type { RetrievalRecord } from '../../database/retrievals/claim'
import { refuseArchivedCampaign, type CampaignRow } from '../campaigns/access'
import { refuseArchivedRecipe } from '../recipes/index'

interface AtPlace { name: string, stationId: string | null, instrumentId: string | null }

/** A submission names no station or instrument that is archived; `pathOf` says where in the request each input stands. */
export async function refuseArchivedPlaces(inputs: AtPlace[], pathOf: (index: number) => string): Promise<void> {
  const archived = new Map((await findArchivedPlaces(database(), idsOf(inputs))).map(place => [place.id, place]))
  const fields = inputs.flatMap((input, index) => {
    const place = archived.get(input.stationId ?? '') ?? archived.get(input.instrumentId ?? '')
    return place ? [{ path: pathOf(index), message: `${input.name} belongs to the ${place.noun} "${place.name}", which is archived.` }] : []
  })
  if (fields.length > 0) throw new DomainError('archived', `${fields[0]!.message} Nothing is submitted under it until an analyst or the lead brings it back.`, fields)
}

const idsOf = (inputs: AtPlace[]) => [...new Set(inputs.flatMap(({ stationId, instrumentId }) => [stationId, instrumentId]).filter(id => id !== null))]

/** A draft is submitted under what stands now, not under what stood when it was made. */
export async function refuseArchivedDraft(campaign: CampaignRow, draft: RetrievalRecord): Promise<void> {
  refuseArchivedCampaign(campaign)
  const recipe = draft.recipeId ? await findRecipeById(database(), draft.recipeId) : undefined
  if (recipe) refuseArchivedRecipe(recipe)
  await refuseArchivedPlaces([draft], () => 'station')
}
