import { config } from '../config'
import { deliverMail } from '../services/outbox/deliver'

/** The worker does this by itself all the time; the task is for asking by hand and as a second string. */
export default defineTask({
  meta: { name: 'deliver-mail', description: 'Sends the mails that are due.' },
  run: async () => ({ result: config().role === 'worker' ? await deliverMail() : null }),
})
