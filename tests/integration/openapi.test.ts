import { expect, it } from 'vitest'
import { origin } from '../helpers/shared-service'

interface Operation { 'security'?: unknown[], 'x-scope': string }

it('the OpenAPI document is served to all, and its word on who may call holds for every call', async () => {
  const response = await fetch(`${origin()}/api/openapi.json`)
  expect([response.status, response.headers.get('content-type')]).toEqual([200, expect.stringContaining('application/json')])
  const document = await response.json() as { openapi: string, servers: { url: string }[], paths: Record<string, Record<string, Operation>> }
  expect([document.openapi, document.servers[0]?.url]).toEqual(['3.1.0', origin()])
  const guarded = Object.entries(document.paths).flatMap(([path, methods]) => Object.entries(methods)
    .filter(([, operation]) => operation['x-scope'] !== 'public')
    .map(([method]) => ({ method: method.toUpperCase(), path: path.replace(/\{\w+\}/g, '01ARZ3NDEKTSV4RRFFQ69G5FAV') })))
  expect(guarded.length).toBeGreaterThan(25)
  for (const { method, path } of guarded) expect([method, path, (await fetch(`${origin()}${path}`, { method })).status]).toEqual([method, path, 401])
})
