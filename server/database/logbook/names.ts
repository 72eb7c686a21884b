import { and, eq, inArray, sql } from 'drizzle-orm'
import { campaigns, instruments, recipes, stations } from '../campaigns/schema'
import type { Queryable } from '../client'
import { retrievals } from '../retrievals/schema'
import { spectra } from '../spectra/schema'

export interface ObjectName { id: string, name: string, address: string | null }

const nothing = sql<string | null>`null`

/** How the things of one kind are called now. */
const lookUp: Record<string, (db: Queryable, ids: string[]) => Promise<ObjectName[]>> = {
  campaign: (db, ids) => db.select({ id: campaigns.id, name: campaigns.title, address: campaigns.slug }).from(campaigns).where(inArray(campaigns.id, ids)),
  station: (db, ids) => db.select({ id: stations.id, name: stations.name, address: stations.slug }).from(stations).where(inArray(stations.id, ids)),
  instrument: (db, ids) => db.select({ id: instruments.id, name: instruments.name, address: instruments.slug }).from(instruments).where(inArray(instruments.id, ids)),
  recipe: (db, ids) => db.select({ id: recipes.id, name: recipes.name, address: sql<string>`concat(${recipes.slug}, '@', ${recipes.version})` }).from(recipes).where(inArray(recipes.id, ids)),
  spectrum: (db, ids) => db.select({ id: spectra.id, name: spectra.name, address: nothing }).from(spectra).where(inArray(spectra.id, ids)),
  retrieval: (db, ids) => db.select({ id: retrievals.id, name: retrievals.name, address: nothing }).from(retrievals).where(inArray(retrievals.id, ids)),
}

/** Names by `kind:id`; a thing that is gone, or of a kind without names, is left out. */
export async function findObjectNames(db: Queryable, objects: { kind: string, id: string }[]): Promise<Map<string, ObjectName>> {
  const byKind = new Map<string, Set<string>>()
  for (const { kind, id } of objects) byKind.set(kind, (byKind.get(kind) ?? new Set()).add(id))
  const found = await Promise.all([...byKind].map(async ([kind, ids]) =>
    (await lookUp[kind]?.(db, [...ids]) ?? []).map((row): [string, ObjectName] => [`${kind}:${row.id}`, row])))
  return new Map(found.flat())
}

/** Every version of the recipe that has this one. */
export async function findSiblingVersions(db: Queryable, recipeId: string): Promise<string[]> {
  const [one] = await db.select({ campaignId: recipes.campaignId, slug: recipes.slug }).from(recipes).where(eq(recipes.id, recipeId))
  if (!one) return []
  const rows = await db.select({ id: recipes.id }).from(recipes).where(and(eq(recipes.campaignId, one.campaignId), eq(recipes.slug, one.slug)))
  return rows.map(row => row.id)
}
