import { and, asc, count, desc, eq, gt, max } from 'drizzle-orm'
import { users } from '../accounts/schema'
import type { Queryable } from '../client'
import { retrievals } from '../retrievals/schema'
import { recipes } from './schema'

export type RecipeRow = typeof recipes.$inferSelect

export const findRecipes = (db: Queryable, campaignId: string, { after, limit }: { after: string | null, limit: number }) =>
  db.select({ recipe: recipes, createdBy: users.name })
    .from(recipes)
    .innerJoin(users, eq(users.id, recipes.createdBy))
    .where(and(eq(recipes.campaignId, campaignId), after ? gt(recipes.id, after) : undefined))
    .orderBy(asc(recipes.id))
    .limit(limit)

export const countRecipes = (db: Queryable, campaignId: string) => db.$count(recipes, eq(recipes.campaignId, campaignId))

export async function newestRecipeVersions(db: Queryable, campaignId: string): Promise<Map<string, number>> {
  const rows = await db.select({ slug: recipes.slug, version: max(recipes.version) })
    .from(recipes).where(eq(recipes.campaignId, campaignId)).groupBy(recipes.slug)
  return new Map(rows.map(row => [row.slug, row.version ?? 0]))
}

/** `version` null: the newest. */
export async function findRecipe(db: Queryable, campaignId: string, { slug, version }: { slug: string, version: number | null }): Promise<RecipeRow | undefined> {
  const [row] = await db.select().from(recipes)
    .where(and(eq(recipes.campaignId, campaignId), eq(recipes.slug, slug), version === null ? undefined : eq(recipes.version, version)))
    .orderBy(desc(recipes.version))
    .limit(1)
  return row
}

export async function findRecipeById(db: Queryable, id: string): Promise<RecipeRow | undefined> {
  const [row] = await db.select().from(recipes).where(eq(recipes.id, id))
  return row
}

export async function insertRecipe(db: Queryable, row: typeof recipes.$inferInsert): Promise<void> {
  await db.insert(recipes).values(row)
}

/** All versions of a recipe, oldest first, with who made them and how many retrievals are under each. */
export const findRecipeVersions = (db: Queryable, campaignId: string, slug: string) =>
  db.select({ recipe: recipes, createdBy: users.name, retrievals: count(retrievals.id) })
    .from(recipes)
    .innerJoin(users, eq(users.id, recipes.createdBy))
    .leftJoin(retrievals, eq(retrievals.recipeId, recipes.id))
    .where(and(eq(recipes.campaignId, campaignId), eq(recipes.slug, slug)))
    .groupBy(recipes.id, users.name)
    .orderBy(asc(recipes.version))

/** Archives, or brings back, every version of a recipe. */
export async function setRecipeArchived(db: Queryable, { campaignId, slug }: { campaignId: string, slug: string }, archivedAt: Date | null): Promise<void> {
  await db.update(recipes).set({ archivedAt }).where(and(eq(recipes.campaignId, campaignId), eq(recipes.slug, slug)))
}
