import { and, eq, sql } from 'drizzle-orm'
import type { MailPreference } from '#shared/types/roles'
import type { Queryable } from '../client'
import { newId } from '../ids'
import { users } from './schema'

export type UserRow = typeof users.$inferSelect

export async function findUser(db: Queryable, id: string): Promise<UserRow | undefined> {
  const [row] = await db.select().from(users).where(eq(users.id, id)).limit(1)
  return row
}

/** The address is compared as stored: in small letters. */
export async function findUserByEmail(db: Queryable, email: string): Promise<UserRow | undefined> {
  const [row] = await db.select().from(users).where(eq(users.email, email)).limit(1)
  return row
}

export async function insertUser(db: Queryable, user: { email: string, name: string, passwordHash: string | null, isAdministrator: boolean, mailPreference?: MailPreference }): Promise<string> {
  const id = newId()
  await db.insert(users).values({ id, ...user, createdAt: new Date() })
  return id
}

/** @returns false when the row has moved on from `version` */
export async function updateUser(db: Queryable, { id, version, changes }: { id: string, version: number, changes: Partial<Pick<UserRow, 'name' | 'mailPreference'>> }): Promise<boolean> {
  const [result] = await db.update(users).set({ ...changes, version: sql`${users.version} + 1` })
    .where(and(eq(users.id, id), eq(users.version, version)))
  return result.affectedRows === 1
}

export async function setPassword(db: Queryable, { id, passwordHash }: { id: string, passwordHash: string }): Promise<void> {
  await db.update(users).set({ passwordHash, version: sql`${users.version} + 1` }).where(eq(users.id, id))
}

export async function administratorExists(db: Queryable): Promise<boolean> {
  const [row] = await db.select({ id: users.id }).from(users).where(eq(users.isAdministrator, true)).limit(1)
  return row !== undefined
}

export async function grantAdministration(db: Queryable, id: string): Promise<void> {
  await db.update(users).set({ isAdministrator: true, version: sql`${users.version} + 1` }).where(and(eq(users.id, id), eq(users.isAdministrator, false)))
}
