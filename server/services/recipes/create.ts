import type { RecipeCreate, RecipeView } from '#shared/schemas/recipe'
import { DomainError } from '#shared/utils/domain-error'
import { findRecipe, insertRecipe, type RecipeRow } from '../../database/campaigns/repository-recipes'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { slugOf } from '../campaigns/slug'
import { getLineList } from '../line-lists/index'
import { checkSettings } from './check-settings'
import { recipeView } from './index'

/** A slug that exists makes the next version. */
export async function createRecipe(actor: Actor, slug: string, input: RecipeCreate): Promise<RecipeView> {
  const { campaign } = await campaignFor(actor, slug, 'edit-recipes')
  const { settings } = input
  const problems = checkSettings(settings, settings.lineList === null ? null : await getLineList(settings.lineList))
  if (problems.length > 0) throw new DomainError('validation_failed', problems[0]!.message, problems)
  const recipe = { campaignId: campaign.id, slug: input.slug ?? (slugOf(input.name) || 'recipe'), name: input.name, settings }
  return recipeView(await storeNextVersion(actor, recipe), actor.name, true)
}

type NewRecipe = Pick<RecipeRow, 'campaignId' | 'slug' | 'name' | 'settings'>

/** Two people may make the next version at once: the unique key lets one through, the other takes the number after it. */
async function storeNextVersion(actor: Actor, recipe: NewRecipe, attemptsLeft = 5): Promise<RecipeRow> {
  try {
    return await database().transaction(async (tx) => {
      const newest = await findRecipe(tx, recipe.campaignId, { slug: recipe.slug, version: null })
      const row: RecipeRow = { ...recipe, id: newId(), version: (newest?.version ?? 0) + 1, createdBy: actor.userId, createdAt: new Date() }
      await insertRecipe(tx, row)
      await writeLogbook(tx, { campaignId: row.campaignId, objectKind: 'recipe', objectId: row.id, actorId: actor.userId, action: 'create', detail: { address: `${row.slug}@${row.version}`, settings: row.settings } })
      return row
    })
  }
  catch (error) {
    if (isDuplicateEntry(error) && attemptsLeft > 1) return storeNextVersion(actor, recipe, attemptsLeft - 1)
    throw error
  }
}
