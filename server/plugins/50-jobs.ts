import { config } from '../config'
import { closeQueue, openQueue } from '../jobs/queue'
import { startWorker } from '../jobs/worker'
import { onStop, started } from '../lifecycle'
import { closeMail } from '../mail/transport'
import { closeThreads } from '../threads/index'
import { stopEventStreams } from '../utils/event-stream'

/** The web process hands work to the queue; the worker process does it. */
export default defineNitroPlugin(() => {
  openQueue()
  onStop('queue', 'queue', closeQueue)
  onStop('queue', 'computing threads', closeThreads)
  if (config().role === 'web') return onStop('streams', 'event streams', stopEventStreams)
  onStop('mail', 'mail', closeMail)
  started().then(() => {
    const worker = startWorker()
    onStop('workers', 'worker', () => worker.close())
  }, () => { /* the start-up has said why and ends the process */ })
})
