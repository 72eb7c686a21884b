import { config } from '../config'
import { sweep } from '../services/retrievals/sweep'

/** The worker does this by itself all the time; the task is for asking by hand and as a second string. */
export default defineTask({
  meta: { name: 'sweep', description: 'Deletes old events and idempotency keys.' },
  run: async () => ({ result: config().role === 'worker' ? await sweep() : null }),
})
