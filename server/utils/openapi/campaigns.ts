import type * as z from 'zod'
import type { CampaignAction } from '#shared/types/roles'
import { campaignCreateSchema, campaignParams, campaignPatchSchema, campaignViewSchema } from '#shared/schemas/campaign'
import { instrumentCreateSchema, instrumentViewSchema } from '#shared/schemas/instrument'
import { pageQuerySchema, pageSchema } from '#shared/schemas/paging'
import { recipeCreateSchema, recipeViewSchema } from '#shared/schemas/recipe'
import { stationCreateSchema, stationViewSchema } from '#shared/schemas/station'
import type { ApiRoute } from './types'

const base = '/api/campaigns/{slug}'

const listOf = (name: string, item: z.ZodType): ApiRoute => ({
  method: 'get', path: `${base}/${name}`, area: 'campaigns', access: 'read', who: 'see', summary: `The ${name} of a campaign.`,
  params: campaignParams, query: pageQuerySchema,
  answers: { 200: { description: 'A page.', schema: pageSchema(item) } },
})

const creationOf = (name: string, who: CampaignAction, summary: string, body: z.ZodType, view: z.ZodType): ApiRoute => ({
  method: 'post', path: `${base}/${name}`, area: 'campaigns', access: 'submit', who, summary, params: campaignParams, body,
  answers: { 201: { description: 'Made.', schema: view } },
  errors: [409],
})

export const campaignRoutes: ApiRoute[] = [
  {
    method: 'get', path: '/api/campaigns', area: 'campaigns', access: 'read', who: 'account', summary: 'The campaigns that the caller may see: as member, or because every account may.',
    query: pageQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(campaignViewSchema) } },
  },
  {
    method: 'post', path: '/api/campaigns', area: 'campaigns', access: 'submit', who: 'account', summary: 'Begin a campaign; the caller becomes its lead.',
    body: campaignCreateSchema,
    answers: { 201: { description: 'Made.', schema: campaignViewSchema } },
    errors: [409],
  },
  {
    method: 'get', path: base, area: 'campaigns', access: 'read', who: 'see', summary: 'One campaign.', params: campaignParams,
    answers: { 200: { description: 'The campaign.', schema: campaignViewSchema } },
  },
  {
    method: 'patch', path: base, area: 'campaigns', access: 'submit', who: 'edit-campaign', summary: 'Change a campaign (lead). A former slug goes on leading to it.', params: campaignParams, body: campaignPatchSchema,
    answers: { 200: { description: 'The campaign as it stands now.', schema: campaignViewSchema } },
    errors: [409],
  },
  listOf('stations', stationViewSchema),
  listOf('instruments', instrumentViewSchema),
  listOf('recipes', recipeViewSchema),
  creationOf('stations', 'edit-equipment', 'Add a station (analyst).', stationCreateSchema, stationViewSchema),
  creationOf('instruments', 'edit-equipment', 'Add an instrument (analyst).', instrumentCreateSchema, instrumentViewSchema),
  creationOf('recipes', 'edit-recipes', 'Add a recipe, or the next version of one (analyst).', recipeCreateSchema, recipeViewSchema),
]
