import { recipeParams } from '#shared/schemas/recipe'
import { archiveRecipe } from '../../../../../services/recipes/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'submit', params: recipeParams }, ({ actor, params }) => archiveRecipe(actor, params, true))
