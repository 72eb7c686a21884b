import { defineEventHandler, getQuery, getRouterParams, setResponseStatus, type H3Event } from 'h3'
import type * as z from 'zod'
import type { DoorRight } from '#shared/utils/permissions'
import type { Actor } from '../services/accounts/actor'
import { requireActor, requireRight } from './auth'
import { refuseCrossSite } from './csrf-check'
import { readJson } from './read-json'
import { validate } from './validate'

type Schema = z.ZodType | undefined
type Parsed<S extends Schema> = S extends z.ZodType ? z.output<S> : undefined
/** `public`: anyone. `read` and `submit`: signed in, or a token with at least that scope. */
export type Access = 'public' | 'read' | 'submit'

export interface RouteOptions<A extends Access, P extends Schema, Q extends Schema, B extends Schema> {
  access: A
  /** Beyond `access`: by hand on a page, or for administrators. What may be done in a campaign is asked by the services. */
  who?: DoorRight
  params?: P
  query?: Q
  body?: B
  /** Of the answer when all is well; 200 when not said. */
  status?: number
}

export interface RouteContext<A extends Access, P extends Schema, Q extends Schema, B extends Schema> {
  event: H3Event
  actor: A extends 'public' ? undefined : Actor
  params: Parsed<P>
  query: Parsed<Q>
  body: Parsed<B>
}

/**
 * The one way to write a route: says who may call it and what its input looks like, and fails closed on both.
 * The body is read only after the caller is known.
 */
export const defineRoute = <A extends Access, P extends Schema = undefined, Q extends Schema = undefined, B extends Schema = undefined>(
  options: RouteOptions<A, P, Q, B>,
  handler: (context: RouteContext<A, P, Q, B>) => unknown,
) => defineEventHandler(async (event) => {
  const actor = options.access === 'public' ? undefined : await requireActor(event, options.access)
  if (actor && options.who) requireRight(actor, options.who)
  if (actor?.via !== 'token') refuseCrossSite(event)
  const context = {
    event,
    actor,
    params: options.params && validate(options.params, getRouterParams(event, { decode: true })),
    query: options.query && validate(options.query, getQuery(event)),
    body: options.body && validate(options.body, await readJson(event)),
  } as RouteContext<A, P, Q, B>
  const answer = await handler(context)
  if (options.status && !event.handled) setResponseStatus(event, options.status)
  return answer
})
