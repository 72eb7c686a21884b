import { campaignParams } from '#shared/schemas/campaign'
import { recipeCreateSchema } from '#shared/schemas/recipe'
import { createRecipe } from '../../../services/recipes/create'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: campaignParams, body: recipeCreateSchema, status: 201 },
  ({ actor, params, body }) => createRecipe(actor, params.slug, body),
)
