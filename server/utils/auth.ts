import { getHeader, type H3Event } from 'h3'
import { DomainError } from '#shared/utils/domain-error'
import { mayOnService, type DoorRight } from '#shared/utils/permissions'
import type { Actor } from '../services/accounts/actor'
import { actorFromToken } from '../services/accounts/tokens'
import { sessionOf } from './session-cookie'

const bearer = /^Bearer\s+(\S+)$/i

/** Who asks, or a refusal. A wrong token is refused even where a good cookie comes along. */
export async function requireActor(event: H3Event, access: 'read' | 'submit'): Promise<Actor> {
  const actor = await actorOf(event)
  if (!actor) throw new DomainError('unauthenticated', 'Sign in, or send an API token as "Authorization: Bearer trl_...".')
  if (access === 'submit' && actor.scope !== 'submit') throw new DomainError('insufficient_scope', 'This token may only read; use one with the scope submit.')
  event.context.userId = actor.userId
  return actor
}

/** What a token never does, and what is for administrators only. */
export function requireRight(actor: Actor, who: DoorRight): void {
  if (mayOnService(actor, who)) return
  if (who !== 'page' && !actor.isAdministrator) throw new DomainError('forbidden', 'This is for administrators of the service.')
  throw new DomainError('forbidden', 'This is done by hand on a page, not with a token.')
}

async function actorOf(event: H3Event): Promise<Actor | null> {
  const authorization = getHeader(event, 'authorization')
  if (authorization === undefined) return (await sessionOf(event))?.actor ?? null
  const token = bearer.exec(authorization)?.[1]
  if (!token) throw new DomainError('unauthenticated', 'The Authorization header must read "Bearer <token>".')
  return actorFromToken(token)
}
