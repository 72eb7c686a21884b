import * as z from 'zod'
import { newTokenSchema, passwordChangeSchema, profileChangeSchema, setUpSchema } from '#shared/schemas/account'
import { idParams } from '#shared/schemas/ids'
import { pageSchema } from '#shared/schemas/paging'
import { mailPreferences, tokenScopes } from '#shared/types/roles'
import type { ApiRoute } from './types'

const time = z.iso.datetime()
const accountSchema = z.object({ id: z.string(), email: z.string(), name: z.string(), isAdministrator: z.boolean(), mailPreference: z.enum(mailPreferences), createdAt: time, version: z.int() })
const tokenSchema = z.object({ id: z.string(), name: z.string(), scope: z.enum(tokenScopes), createdAt: time, expiresAt: time.nullable(), lastUsedAt: time.nullable() })
const deviceSchema = z.object({ id: z.string(), userAgent: z.string(), createdAt: time, lastSeenAt: time, expiresAt: time, isThisOne: z.boolean() })
const checkSchema = z.enum(['ok', 'full', 'down'])
const readySchema = z.object({ status: z.enum(['ready', 'degraded', 'unavailable']), role: z.string(), checks: z.object({ database: checkSchema, schema: checkSchema, storage: checkSchema, redis: checkSchema }) })
const authPath = z.object({ path: z.string() })

export const accountRoutes: ApiRoute[] = [
  {
    method: 'get', path: '/api/me', area: 'account', access: 'read', who: 'account', summary: 'The caller\'s own account.',
    answers: { 200: { description: 'The account.', schema: accountSchema } },
  },
  {
    method: 'patch', path: '/api/me', area: 'account', access: 'submit', who: 'account', summary: 'Change name or mail preference.', body: profileChangeSchema,
    answers: { 200: { description: 'The account as it stands now.', schema: accountSchema } },
    errors: [409],
  },
  {
    method: 'get', path: '/api/me/tokens', area: 'account', access: 'read', who: 'account', summary: 'The caller\'s API tokens, without their text.',
    answers: { 200: { description: 'All of them.', schema: pageSchema(tokenSchema) } },
  },
  {
    method: 'post', path: '/api/me/tokens', area: 'account', access: 'submit', who: 'page', summary: 'Make an API token (signed in on a page only).', body: newTokenSchema,
    answers: { 201: { description: 'Made; the text of the token is in this answer and nowhere else.', schema: tokenSchema.extend({ token: z.string() }) } },
  },
  {
    method: 'delete', path: '/api/me/tokens/{id}', area: 'account', access: 'submit', who: 'page', summary: 'Remove a token (signed in on a page only).', params: idParams,
    answers: { 204: { description: 'Removed.' } },
  },
  {
    method: 'get', path: '/api/me/devices', area: 'account', access: 'read', who: 'page', summary: 'Where the account is signed in.',
    answers: { 200: { description: 'All sign-ins that live.', schema: pageSchema(deviceSchema) } },
  },
  {
    method: 'delete', path: '/api/me/devices/{id}', area: 'account', access: 'submit', who: 'page', summary: 'End one sign-in.', params: idParams,
    answers: { 204: { description: 'Ended.' } },
  },
  {
    method: 'post', path: '/api/me/sign-out-elsewhere', area: 'account', access: 'submit', who: 'page', summary: 'End every sign-in but this one.',
    answers: { 200: { description: 'Done.', schema: z.object({ ended: z.int() }) } },
  },
  {
    method: 'post', path: '/api/me/password', area: 'account', access: 'submit', who: 'page', summary: 'Change the password; every other sign-in ends.', body: passwordChangeSchema,
    answers: { 204: { description: 'Changed.' } },
    errors: [429],
  },
  {
    method: 'post', path: '/api/set-up', area: 'account', access: 'public', who: 'anyone', summary: 'Make the first administrator with the one-time link.', body: setUpSchema,
    answers: { 201: { description: 'Made.', schema: z.object({ id: z.string(), email: z.string() }) } },
    errors: [404, 409],
  },
  {
    method: 'get', path: '/api/auth/{path}', area: 'account', access: 'public', who: 'anyone', summary: 'Session, form token and sign-in page, for the pages of this service.', params: authPath,
    answers: { 200: { description: 'As the pages need it.' }, 302: { description: 'On to a page.' } },
  },
  {
    method: 'post', path: '/api/auth/{path}', area: 'account', access: 'public', who: 'anyone', summary: 'Signing in and out, from the pages of this service.', params: authPath,
    answers: { 200: { description: 'Done.' }, 302: { description: 'On to a page.' } },
    errors: [401, 403, 429],
  },
]

export const serviceRoutes: ApiRoute[] = [
  {
    method: 'get', path: '/api/health', area: 'service', access: 'public', who: 'anyone', summary: 'Is the process alive?',
    answers: { 200: { description: 'Yes.', schema: z.object({ status: z.literal('alive') }) } },
  },
  {
    method: 'get', path: '/api/ready', area: 'service', access: 'public', who: 'anyone', summary: 'Can it do its work? Degraded: the queue is away, submissions wait.',
    answers: { 200: { description: 'Ready, or degraded.', schema: readySchema }, 503: { description: 'Something that it needs is down.', schema: readySchema } },
  },
  {
    method: 'get', path: '/api/openapi.json', area: 'service', access: 'public', who: 'anyone', summary: 'This document.',
    answers: { 200: { description: 'OpenAPI 3.1.', schema: z.record(z.string(), z.unknown()) } },
  },
]
