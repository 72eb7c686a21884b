import { pageOf, type PageQuery } from '#shared/schemas/paging'
import { parseRecipeAddress, type RecipeView } from '#shared/schemas/recipe'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countRecipes, findRecipe, findRecipes, newestRecipeVersions, type RecipeRow } from '../../database/campaigns/repository-recipes'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'

export const recipeView = (row: RecipeRow, createdBy: string, newest: boolean): RecipeView => ({
  id: row.id,
  address: `${row.slug}@${row.version}`,
  slug: row.slug,
  version: row.version,
  name: row.name,
  settings: row.settings,
  createdBy,
  createdAt: row.createdAt.toISOString(),
  newest,
})

export async function listRecipes(actor: Actor, slug: string, query: PageQuery): Promise<Page<RecipeView>> {
  const { campaign } = await campaignFor(actor, slug, 'see')
  const db = database()
  const [rows, total, newest] = await Promise.all([
    findRecipes(db, campaign.id, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countRecipes(db, campaign.id),
    newestRecipeVersions(db, campaign.id),
  ])
  return pageOf(rows, {
    limit: query.limit,
    total,
    id: row => row.recipe.id,
    view: row => recipeView(row.recipe, row.createdBy, newest.get(row.recipe.slug) === row.recipe.version),
  })
}

/** `slug@version`, or `slug` for the newest one, of a campaign that the caller has been let into. */
export async function recipeByAddress(campaignId: string, address: string): Promise<RecipeRow> {
  const row = await findRecipe(database(), campaignId, parseRecipeAddress(address))
  if (!row) throw new DomainError('validation_failed', `This campaign has no recipe ${address}.`, [{ path: 'recipe', message: 'No such recipe in this campaign.' }])
  return row
}
