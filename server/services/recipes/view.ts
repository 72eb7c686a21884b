import type { RecipeView } from '#shared/schemas/recipe'
import type { RecipeRow } from '../../database/campaigns/repository-recipes'

export const addressOf = ({ slug, version }: Pick<RecipeRow, 'slug' | 'version'>): string => `${slug}@${version}`

export const recipeView = (row: RecipeRow, createdBy: string, newest: boolean): RecipeView => ({
  id: row.id,
  address: addressOf(row),
  slug: row.slug,
  version: row.version,
  name: row.name,
  settings: row.settings,
  createdBy,
  createdAt: row.createdAt.toISOString(),
  newest,
  archivedAt: row.archivedAt?.toISOString() ?? null,
})
