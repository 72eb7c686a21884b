import { getHeader } from 'h3'
import * as z from 'zod'
import { submitRetrievalsSchema } from '#shared/schemas/retrieval-submit'
import { submitRetrievals } from '../../../services/retrievals/submit'
import { defineRoute } from '../../../utils/route'
import { validate } from '../../../utils/validate'

const keySchema = z.string().trim().min(1).max(200).optional()

export default defineRoute({
  access: 'submit',
  params: z.object({ slug: z.string().max(64) }),
  body: submitRetrievalsSchema,
  status: 202,
}, ({ event, actor, params, body }) => submitRetrievals({
  actor, slug: params.slug, body, idempotencyKey: validate(keySchema, getHeader(event, 'idempotency-key')) ?? null,
}))
