import type { Transaction } from '../../database/client'
import { newId } from '../../database/ids'
import { insertOutbox, type OutboxRecord } from '../../database/outbox/repository'
import { messageIdFor } from './message-id'

type Order = { /** Unique: what it is about, so that a thing is told once. */ subjectKey: string, kind: OutboxRecord['kind'], payload: OutboxRecord['payload'] }
  & ({ userId: string } | { address: string })

/** Puts a mail in the outbox, in the transaction of what it tells. */
export const putMail = (tx: Transaction, order: Order): Promise<void> =>
  insertOutbox(tx, { ...order, id: newId(), messageId: messageIdFor(order.subjectKey) })
