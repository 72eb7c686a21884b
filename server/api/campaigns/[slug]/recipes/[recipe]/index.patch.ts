import { recipeParams, recipePatchSchema } from '#shared/schemas/recipe'
import { changeRecipe } from '../../../../../services/recipes/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute(
  { access: 'submit', params: recipeParams, body: recipePatchSchema },
  ({ actor, params, body }) => changeRecipe(actor, params, body),
)
