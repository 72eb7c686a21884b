import * as z from 'zod'
import { campaignParams } from '#shared/schemas/campaign'
import { pageSchema } from '#shared/schemas/paging'
import { retrievalExportQuerySchema, retrievalListQuerySchema } from '#shared/schemas/retrieval-list'
import { idParams } from '#shared/schemas/ids'
import { reviewRetrievalSchema, reviseRetrievalSchema, submitRetrievalsSchema } from '#shared/schemas/retrieval-submit'
import { phases } from '#shared/types/phases'
import { batchCountsSchema, deskSchema, pictureSchema, retrievalDetailSchema, retrievalRowSchema } from './answers'
import type { ApiRoute } from './types'

const revisionSchema = z.object({ id: z.string(), revision: z.int() })
const one = (tail = '') => ({ path: `/api/retrievals/{id}${tail}`, area: 'retrievals', params: idParams })
const events = { description: 'Events `phase` and `progress` with ids, a comment every 15 s, and a closing `done`. Last-Event-ID resumes.', type: 'text/event-stream' }
const resume = [{ name: 'Last-Event-ID', description: 'The id of the last event seen; what came after it is sent again.' }]

export const retrievalRoutes: ApiRoute[] = [
  {
    method: 'post', path: '/api/campaigns/{slug}/retrievals', area: 'retrievals', access: 'submit', who: 'submit', summary: 'Submit spectra or one line table under a recipe.', params: campaignParams, body: submitRetrievalsSchema,
    headers: [{ name: 'Idempotency-Key', description: 'Per account, kept 24 hours: the same key and body give the same answer, another body 409.' }],
    answers: { 202: { description: 'Accepted; ids in the order given.', schema: z.object({ batchId: z.string(), ids: z.array(z.string()) }) } },
    errors: [409],
  },
  {
    method: 'get', path: '/api/retrievals', area: 'retrievals', access: 'read', who: 'account', summary: 'All retrievals that the caller may see, filtered and sorted.', query: retrievalListQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(retrievalRowSchema) } },
  },
  {
    method: 'get', path: '/api/exports/retrievals', area: 'retrievals', access: 'read', who: 'account', summary: 'The same filter as a table, streamed.', query: retrievalExportQuerySchema,
    answers: { 200: { description: 'The table.', type: 'text/csv' } },
  },
  { ...one(), method: 'get', access: 'read', who: 'see', summary: 'One retrieval with its result, every line and its provenance.', answers: { 200: { description: 'The retrieval.', schema: retrievalDetailSchema } } },
  { ...one('/picture'), method: 'get', access: 'read', who: 'see', summary: 'Spectrum, model and continuum for a plot.', answers: { 200: { description: 'At most 4000 points.', schema: pictureSchema } }, errors: [409] },
  { ...one('/events'), method: 'get', access: 'read', who: 'see', summary: 'What happens to one retrieval, as server-sent events.', headers: resume, answers: { 200: events } },
  { ...one('/abort'), method: 'post', access: 'submit', who: 'abort-own', whoForOthers: 'abort-any', summary: 'Abort it.', answers: { 202: { description: 'It will end.', schema: z.object({ id: z.string(), phase: z.enum(phases) }) } }, errors: [409] },
  { ...one('/submit'), method: 'post', access: 'submit', who: 'submit', whoForOthers: 'revise-any', summary: 'Queue a draft, or a held one whose spectrum is complete now.', answers: { 202: { description: 'Queued.', schema: revisionSchema } }, errors: [409, 422] },
  { ...one('/revise'), method: 'post', access: 'submit', who: 'revise-own', whoForOthers: 'revise-any', summary: 'Fit again with other settings, as the next revision.', body: reviseRetrievalSchema, answers: { 202: { description: 'Queued.', schema: revisionSchema } }, errors: [409] },
  { ...one('/review'), method: 'post', access: 'submit', who: 'review', summary: 'Accept or return the result.', body: reviewRetrievalSchema, answers: { 200: { description: 'Noted.', schema: z.object({ id: z.string(), verdict: z.enum(['accept', 'return']) }) } }, errors: [409] },
  {
    method: 'get', path: '/api/batches/{id}', area: 'retrievals', access: 'read', who: 'see', summary: 'How far a submission is.', params: idParams,
    answers: { 200: { description: 'Counts by phase.', schema: batchCountsSchema } },
  },
  {
    method: 'get', path: '/api/batches/{id}/events', area: 'retrievals', access: 'read', who: 'see', summary: 'Every event of a submission in one stream.', params: idParams, headers: resume,
    answers: { 200: events },
  },
  {
    method: 'get', path: '/api/desk', area: 'retrievals', access: 'read', who: 'account', summary: 'What runs, what came back and what waits for the caller.',
    answers: { 200: { description: 'Lists of at most ten rows, newest first.', schema: deskSchema } },
  },
]
