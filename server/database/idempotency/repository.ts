import { and, eq, lt } from 'drizzle-orm'
import type { Queryable } from '../client'
import { idempotencyKeys } from './schema'

export type IdempotencyRecord = typeof idempotencyKeys.$inferSelect

export async function findIdempotencyKey(db: Queryable, userId: string, key: string): Promise<IdempotencyRecord | undefined> {
  const [row] = await db.select().from(idempotencyKeys).where(and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.key, key)))
  return row
}

export async function insertIdempotencyKey(db: Queryable, row: Omit<IdempotencyRecord, 'createdAt'>): Promise<void> {
  await db.insert(idempotencyKeys).values({ ...row, createdAt: new Date() })
}

export async function deleteIdempotencyKey(db: Queryable, userId: string, key: string): Promise<void> {
  await db.delete(idempotencyKeys).where(and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.key, key)))
}

export async function deleteIdempotencyKeysBefore(db: Queryable, before: Date): Promise<void> {
  await db.delete(idempotencyKeys).where(lt(idempotencyKeys.createdAt, before))
}
