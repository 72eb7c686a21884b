import { lineListParams, lineListSchema, lineListSummarySchema } from '#shared/schemas/line-list'
import { logbookQuerySchema, logbookViewSchema } from '#shared/schemas/logbook'
import { pageSchema } from '#shared/schemas/paging'
import type { ApiRoute } from './types'

export const lineListRoutes: ApiRoute[] = [
  {
    method: 'get', path: '/api/line-lists', area: 'line lists', access: 'read', who: 'account', summary: 'The line lists, without their lines.',
    answers: { 200: { description: 'All of them.', schema: pageSchema(lineListSummarySchema) } },
  },
  {
    method: 'get', path: '/api/line-lists/{id}', area: 'line lists', access: 'read', who: 'account', summary: 'One line list in full, with an ETag.', params: lineListParams,
    answers: { 200: { description: 'The list.', schema: lineListSchema }, 304: { description: 'Still the one that If-None-Match names.' } },
  },
]

export const logbookRoutes: ApiRoute[] = [
  {
    method: 'get', path: '/api/logbook', area: 'logbook', access: 'read', who: 'account', summary: 'Who did what when: with one thing (oldest first), or in a campaign (newest first).', query: logbookQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(logbookViewSchema) } },
    errors: [404],
  },
]
