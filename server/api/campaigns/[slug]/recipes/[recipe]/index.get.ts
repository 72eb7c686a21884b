import { recipeParams } from '#shared/schemas/recipe'
import { readRecipe } from '../../../../../services/recipes/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'read', params: recipeParams }, ({ actor, params }) => readRecipe(actor, params))
