import { createHmac } from 'node:crypto'
import { secret } from '../../secrets'

/**
 * The secret of a link that a mail carries. It is made anew from what the link is for whenever it is needed, so that
 * the database and the outbox hold its hash alone.
 */
export const linkSecret = (purpose: string): string => createHmac('sha256', secret('links')).update(purpose).digest('base64url')
