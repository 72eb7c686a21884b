import { config } from '../config'
import { announceFinishedBatches } from '../services/outbox/announce-batches'

/** The worker does this by itself all the time; the task is for asking by hand and as a second string. */
export default defineTask({
  meta: { name: 'digests', description: 'Announces batches that have ended.' },
  run: async () => ({ result: config().role === 'worker' ? await announceFinishedBatches() : null }),
})
