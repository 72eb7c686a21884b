import { pageOf, type PageQuery } from '#shared/schemas/paging'
import { parseRecipeAddress, recipeAddressSchema, type RecipeView } from '#shared/schemas/recipe'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countRecipes, findRecipe, findRecipes, newestRecipeVersions, type RecipeRow } from '../../database/campaigns/repository-recipes'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { recipeView } from './view'

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

/** `slug@version`, or `slug` for the newest one, for a submission to a campaign that the caller has been let into. */
export async function recipeByAddress(campaignId: string, address: string): Promise<RecipeRow> {
  const known = recipeAddressSchema.safeParse(address)
  const row = known.success ? await findRecipe(database(), campaignId, parseRecipeAddress(known.data)) : undefined
  if (!row) throw new DomainError('validation_failed', `This campaign has no recipe ${address}.`, [{ path: 'recipe', message: 'No such recipe in this campaign.' }])
  refuseArchivedRecipe(row)
  return row
}

export function refuseArchivedRecipe({ name, archivedAt }: Pick<RecipeRow, 'name' | 'archivedAt'>): void {
  if (archivedAt) throw new DomainError('archived', `The recipe "${name}" is archived. Choose another one, or ask an analyst or the lead to bring it back.`, [{ path: 'recipe', message: 'This recipe is archived.' }])
}
