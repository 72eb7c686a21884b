import { and, asc, desc, eq, gt, max } from 'drizzle-orm'
import { users } from '../accounts/schema'
import type { Queryable } from '../client'
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

export async function insertRecipe(db: Queryable, row: typeof recipes.$inferInsert): Promise<void> {
  await db.insert(recipes).values(row)
}
