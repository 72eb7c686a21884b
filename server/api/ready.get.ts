import { setResponseStatus } from 'h3'
import { readiness } from '../services/health/readiness'
import { defineRoute } from '../utils/route'
import { bundledMigrations } from '../utils/start-up'

export default defineRoute({ access: 'public' }, async ({ event }) => {
  const answer = await readiness(await bundledMigrations())
  if (answer.status === 'unavailable') setResponseStatus(event, 503)
  return answer
})
