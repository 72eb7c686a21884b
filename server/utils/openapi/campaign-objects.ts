import type * as z from 'zod'
import { campaignParams, campaignViewSchema } from '#shared/schemas/campaign'
import { instrumentParams, instrumentPatchSchema, instrumentViewSchema } from '#shared/schemas/instrument'
import { pageSchema } from '#shared/schemas/paging'
import { recipeDetailSchema, recipeParams, recipePatchSchema } from '#shared/schemas/recipe'
import { stationNightSchema, stationNightsQuerySchema, stationParams, stationPatchSchema, stationViewSchema } from '#shared/schemas/station'
import type { CampaignAction } from '#shared/types/roles'
import type { ApiRoute } from './types'

interface Kind { path: string, who: CampaignAction, noun: string, params: z.ZodType, patch: z.ZodType, view: z.ZodType, change: string }

/** Reading, changing, archiving and bringing back one thing that a campaign owns. */
function callsOn({ path, who, noun, params, patch, view, change }: Kind): ApiRoute[] {
  const common = { area: 'campaigns', params } as const
  const answers = { 200: { description: `The ${noun} as it stands now.`, schema: view } }
  return [
    { ...common, method: 'get', path, access: 'read', who: 'see', summary: `One ${noun}.`, answers },
    { ...common, method: 'patch', path, access: 'submit', who, summary: change, body: patch, answers, errors: [409] },
    { ...common, method: 'post', path: `${path}/archive`, access: 'submit', who, summary: `Archive the ${noun} (analyst): nothing is submitted under it any more.`, answers, errors: [409] },
    { ...common, method: 'post', path: `${path}/unarchive`, access: 'submit', who, summary: `Bring the ${noun} back (analyst).`, answers, errors: [409] },
  ]
}

const base = '/api/campaigns/{slug}'

const archivingOfCampaign = (verb: 'archive' | 'unarchive', summary: string): ApiRoute => ({
  method: 'post', path: `${base}/${verb}`, area: 'campaigns', access: 'submit', who: 'archive', params: campaignParams, summary,
  answers: { 200: { description: 'The campaign as it stands now.', schema: campaignViewSchema } },
  errors: [409],
})

export const campaignObjectRoutes: ApiRoute[] = [
  archivingOfCampaign('archive', 'Archive a campaign (lead): it can be read, and nothing is added or changed.'),
  archivingOfCampaign('unarchive', 'Bring a campaign back (lead).'),
  ...callsOn({ path: `${base}/stations/{station}`, who: 'edit-equipment', noun: 'station', params: stationParams, patch: stationPatchSchema, view: stationViewSchema, change: 'Change a station (analyst). Its slug stays.' }),
  ...callsOn({ path: `${base}/instruments/{instrument}`, who: 'edit-equipment', noun: 'instrument', params: instrumentParams, patch: instrumentPatchSchema, view: instrumentViewSchema, change: 'Change an instrument (analyst). Its slug stays.' }),
  ...callsOn({
    path: `${base}/recipes/{recipe}`, who: 'edit-recipes', noun: 'recipe', params: recipeParams, patch: recipePatchSchema, view: recipeDetailSchema,
    change: 'Make the next version of a recipe (analyst). {recipe} is slug or slug@version; archiving takes all versions.',
  }),
  {
    method: 'get', path: `${base}/stations/{station}/nights`, area: 'campaigns', access: 'read', who: 'see', summary: 'What came in at a station, night by night, newest first; a night runs noon to noon in its mean solar time.',
    params: stationParams, query: stationNightsQuerySchema,
    answers: { 200: { description: 'A page; the cursor is the last night.', schema: pageSchema(stationNightSchema) } },
  },
]
