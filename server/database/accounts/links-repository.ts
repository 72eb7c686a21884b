import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Queryable } from '../client'
import { oneTimeLinks } from './schema'

/** Marks the link as used. Of several that try at once one wins. @returns false when it is unknown, used or too old */
export async function takeLink(db: Queryable, { purpose, tokenHash }: { purpose: 'set-up', tokenHash: string }): Promise<boolean> {
  const now = new Date()
  const [result] = await db.update(oneTimeLinks).set({ usedAt: now })
    .where(and(eq(oneTimeLinks.tokenHash, tokenHash), eq(oneTimeLinks.purpose, purpose), isNull(oneTimeLinks.usedAt), gt(oneTimeLinks.expiresAt, now)))
  return result.affectedRows === 1
}
