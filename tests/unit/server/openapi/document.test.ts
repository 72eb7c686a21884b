import { readdirSync, readFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import { describe, expect, it } from 'vitest'
import { isDoorRight } from '#shared/utils/permissions'
import { openApiDocument } from '../../../../server/utils/openapi/document'
import { apiRoutes } from '../../../../server/utils/openapi/routes'

interface Operation {
  operationId: string
  summary: string
  security?: unknown[]
  parameters: { name: string, in: string, required: boolean }[]
  requestBody?: { content: Record<string, unknown> }
  responses: Record<string, unknown>
}
const folder = join(import.meta.dirname, '../../../../server/api')
const files = readdirSync(folder, { recursive: true, withFileTypes: true }).filter(entry => entry.isFile()).map(entry => relative(folder, join(entry.parentPath, entry.name)))

/** `campaigns/[slug]/index.get.ts` -> `get /api/campaigns/{slug}`; a catch-all without a method takes GET and POST. */
function callsOf(file: string): string[] {
  if (file === '[...].ts') return []
  const [, stem = '', method] = /^(.*?)(?:\.(get|post|patch|put|delete))?\.ts$/.exec(file) ?? []
  const path = `/api/${stem}`.replace(/\/index$/, '').replace('[...]', '{path}').replaceAll('[', '{').replaceAll(']', '}')
  return (method ? [method] : ['get', 'post']).map(verb => `${verb} ${path}`)
}

const document = JSON.parse(JSON.stringify(openApiDocument(apiRoutes, 'http://127.0.0.1:4310'))) as { openapi: string, paths: Record<string, Record<string, Operation>> }
const operations = Object.entries(document.paths).flatMap(([path, methods]) => Object.entries(methods).map(([method, operation]) => ({ path, method, operation })))

describe('the OpenAPI document', () => {
  it('has an entry for every route file, and a route file for every entry', () => {
    expect(files.length).toBeGreaterThan(20)
    expect(operations.map(({ method, path }) => `${method} ${path}`).sort()).toEqual(files.flatMap(callsOf).sort())
  })

  it('names the access and the good status that the route itself names', () => {
    for (const file of files.filter(name => !name.includes('[...]'))) {
      const source = readFileSync(join(folder, file), 'utf8')
      const [call = ''] = callsOf(file)
      const route = apiRoutes.find(({ method, path }) => `${method} ${path}` === call)
      expect([call, /access: '(\w+)'/.exec(source)?.[1]]).toEqual([call, route?.access])
      const enforced = route && isDoorRight(route.who) ? route.who : undefined
      expect([call, /who: '([\w-]+)'/.exec(source)?.[1]]).toEqual([call, enforced])
      const status = Number(/status: (\d+)/.exec(source)?.[1] ?? 200)
      expect([call, Object.keys(route?.answers ?? {}).map(Number)]).toEqual([call, expect.arrayContaining([status])])
    }
  })

  it('describes every parameter of an address as required', () => {
    for (const { path, operation } of operations) {
      const named = [...path.matchAll(/\{(\w+)\}/g)].map(match => match[1])
      const described = operation.parameters.filter(parameter => parameter.in === 'path' && parameter.required).map(parameter => parameter.name)
      expect([path, described]).toEqual([path, named])
    }
  })

  it('gives every call its own name and an answer for those who are not signed in', () => {
    expect(new Set(operations.map(({ operation }) => operation.operationId)).size).toBe(operations.length)
    for (const { path, operation } of operations) expect([path, '401' in operation.responses || operation.security?.length === 0]).toEqual([path, true])
  })

  it('says that an upload is a form or JSON, and that a submission takes an Idempotency-Key', () => {
    const upload = document.paths['/api/campaigns/{slug}/spectra']!.post!
    expect(Object.keys(upload.requestBody!.content).sort()).toEqual(['application/json', 'multipart/form-data'])
    const submission = document.paths['/api/campaigns/{slug}/retrievals']!.post!
    expect(submission.parameters.some(parameter => parameter.in === 'header' && parameter.name === 'Idempotency-Key')).toBe(true)
  })

  it('leaves no schema empty: a number in a query is a number, a list of choices has its choices', () => {
    const list = document.paths['/api/retrievals']!.get! as unknown as { parameters: { name: string, schema: Record<string, unknown> }[] }
    const schemaOf = (name: string) => list.parameters.find(parameter => parameter.name === name)!.schema
    expect(schemaOf('limit')).toMatchObject({ type: 'integer', minimum: 1, maximum: 500 })
    expect(JSON.stringify(schemaOf('phase'))).toContain('HELD')
    expect(JSON.stringify(schemaOf('sort'))).toContain('-created')
  })
})
