import * as z from 'zod'
import { errorStatus } from '#shared/types/error-codes'
import type { Who } from '#shared/types/roles'
import type { ApiAnswer, ApiRoute } from './types'

type Json = Record<string, unknown>

const errorWords: Record<number, string> = {
  400: 'The request cannot be read.',
  401: 'Not signed in, or the token is not valid.',
  403: 'The caller may not do this.',
  404: 'There is no such thing, or it belongs to a campaign that the caller is no member of.',
  409: 'In conflict with how things stand now; for a stale version the current row is in error.current.',
  413: 'Too large.',
  415: 'This kind of content is not taken.',
  422: 'Understood, but not valid; error.fields says where.',
  429: 'Too many requests; see Retry-After.',
  503: 'Something that the service needs is down, or storage is full.',
}

const errorSchema = z.object({
  error: z.object({
    code: z.enum(Object.keys(errorStatus) as [string, ...string[]]),
    message: z.string().describe('What is wrong and how to mend it.'),
    fields: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
    current: z.unknown().optional().describe('The row as it stands now, for a stale version.'),
  }),
})

function toSchema(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _, ...json } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json
  return json
}

const content = (type: string, schema: Json) => ({ [type]: { schema } })

/** Path and query parameters, one by one, from the object schema that validates them. */
function parameters(schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return []
  const { properties = {}, required = [] } = toSchema(schema, 'input') as { properties?: Record<string, Json>, required?: string[] }
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }))
}

const headerParameters = (route: ApiRoute): Json[] =>
  (route.headers ?? []).map(({ name, description, required = false }) => ({ name, in: 'header', required, description, schema: { type: 'string' } }))

function requestBody(route: ApiRoute): Json {
  const bodies = route.bodies ?? (route.body ? { 'application/json': route.body } : undefined)
  if (!bodies) return {}
  const kinds = Object.entries(bodies).map(([type, schema]) => content(type, toSchema(schema, 'input')))
  return { requestBody: { required: true, content: Object.assign({}, ...kinds) } }
}

function answer({ description, schema, type = 'application/json' }: ApiAnswer): Json {
  if (!schema && type === 'application/json') return { description }
  return { description, content: content(type, schema ? toSchema(schema, 'output') : { type: 'string' }) }
}

/** Nobody who is signed in is refused these for their role. */
const openToAccounts = new Set<Who>(['anyone', 'account', 'see', 'export'])

function errorStatuses(route: ApiRoute): number[] {
  const statuses = new Set(route.errors ?? [])
  if (route.access !== 'public') statuses.add(401)
  if (route.access === 'submit' || !openToAccounts.has(route.who)) statuses.add(403)
  if (route.path.includes('{')) statuses.add(404)
  if (route.body ?? route.bodies) for (const status of [400, 413, 415, 422]) statuses.add(status)
  if (route.query ?? route.params) statuses.add(422)
  statuses.add(503)
  return [...statuses].sort((a, b) => a - b)
}

function responses(route: ApiRoute): Json {
  const good = Object.entries(route.answers).map(([status, said]) => [status, answer(said)])
  const bad = errorStatuses(route).filter(status => !(status in route.answers))
    .map(status => [String(status), { description: errorWords[status], content: content('application/json', { $ref: '#/components/schemas/Error' }) }])
  return Object.fromEntries([...good, ...bad])
}

function operation(route: ApiRoute): Json {
  return {
    operationId: operationId(route),
    tags: [route.area],
    summary: route.summary,
    ...(route.access === 'public' ? { security: [] } : {}),
    parameters: [...parameters(route.params, 'path'), ...parameters(route.query, 'query'), ...headerParameters(route)],
    ...requestBody(route),
    responses: responses(route),
    'x-scope': route.access,
    'x-who': route.who,
    ...(route.whoForOthers ? { 'x-who-for-others': route.whoForOthers } : {}),
  }
}

const operationId = ({ method, path }: ApiRoute) =>
  `${method}_${path.replace(/^\/api\//, '').replace(/[{}]/g, '').replace(/[^a-zA-Z0-9]+/g, '_')}`

/** OpenAPI 3.1 of the routes given. */
export function openApiDocument(routes: ApiRoute[], origin: string): Json {
  const paths: Record<string, Json> = {}
  for (const route of routes) (paths[route.path] ??= {})[route.method] = operation(route)
  return {
    openapi: '3.1.0',
    info: {
      title: 'Trotline',
      version: '1',
      summary: 'From observed molecular spectra to rotational temperatures.',
      description: 'Ids are opaque strings, times RFC 3339 in UTC. Scripts send "Authorization: Bearer <token>"; changes made with the session cookie must come from the pages of this service.',
    },
    servers: [{ url: origin }],
    security: [{ token: [] }, { session: [] }],
    paths,
    components: {
      securitySchemes: {
        token: { type: 'http', scheme: 'bearer', description: 'An API token of scope read or submit (x-scope names what a call needs, x-who for whom it is).' },
        session: { type: 'apiKey', in: 'cookie', name: 'session', description: 'The browser\'s session cookie.' },
      },
      schemas: { Error: toSchema(errorSchema, 'output') },
    },
  }
}
