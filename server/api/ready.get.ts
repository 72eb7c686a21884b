import { setResponseStatus } from 'h3'
import { readiness } from '../utils/readiness'
import { defineRoute } from '../utils/route'

export default defineRoute({ access: 'public' }, async ({ event }) => {
  const answer = await readiness()
  if (answer.status === 'unavailable') setResponseStatus(event, 503)
  return answer
})
