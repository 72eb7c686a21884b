import type { RecipeCreate, RecipeView } from '#shared/schemas/recipe'
import { findRecipe } from '../../database/campaigns/repository-recipes'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { slugFor } from '../campaigns/store-new'
import { refuseUnusable, storeVersion } from './store-version'
import { recipeView } from './view'

/** A slug that exists makes the next version. */
export async function createRecipe(actor: Actor, slug: string, input: RecipeCreate): Promise<RecipeView> {
  const { campaign } = await campaignFor(actor, slug, 'edit-recipes')
  await refuseUnusable(input.settings)
  const isTaken = async (candidate: string) => await findRecipe(database(), campaign.id, { slug: candidate, version: null }) !== undefined
  const address = input.slug ?? await slugFor(input.name, 'recipe', isTaken)
  const row = await storeVersion(actor, { campaignId: campaign.id, slug: address, name: input.name, settings: input.settings })
  return recipeView(row!, actor.name, true)
}
