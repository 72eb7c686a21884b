import { config } from '../config'
import { reconcile } from '../services/retrievals/reconcile'

/** The worker does this by itself all the time; the task is for asking by hand and as a second string. */
export default defineTask({
  meta: { name: 'reconcile', description: 'Dispatches again what the queue has lost.' },
  run: async () => ({ result: config().role === 'worker' ? await reconcile() : null }),
})
