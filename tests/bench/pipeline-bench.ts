import type { Connection } from 'mysql2/promise'
import { performance } from 'node:perf_hooks'
import { connect, rowsOf } from '../helpers/accounts'
import { uploadSpectra, type SpectraAtHand } from '../helpers/batch-of-spectra'
import { createStack, destroyStack, sleep, startWeb, startWorker } from '../helpers/stack'

const patienceSeconds = 120

interface Stored { retrievalId: string, temperature: number, labels: string[], pixels: number }

/** From the POST to the last stored result, seconds. */
async function timeBatch(connection: Connection, { owner, slug, spectrumIds }: SpectraAtHand, settings: object): Promise<number> {
  const begin = performance.now()
  const { status, body } = await owner.call<{ batchId: string }>('POST', `/api/campaigns/${slug}/retrievals`, { spectrumIds, settings })
  if (status !== 202) throw new Error(`The batch was refused: ${JSON.stringify(body).slice(0, 400)}`)
  for (;;) {
    const [stored] = await rowsOf<{ n: number }>(connection, 'SELECT COUNT(*) AS n FROM retrieval_results r JOIN retrievals t ON t.id = r.retrieval_id WHERE t.batch_id = ?', [body.batchId])
    const seconds = (performance.now() - begin) / 1000
    if (stored!.n === spectrumIds.length) return seconds
    if (seconds > patienceSeconds) throw new Error(`Only ${stored!.n} of ${spectrumIds.length} results after ${patienceSeconds} s.`)
    await sleep(20)
  }
}

async function storedResults(connection: Connection): Promise<Stored[]> {
  const rows = await rowsOf<{ id: string, result: string | object }>(connection, 'SELECT t.id, r.result FROM retrieval_results r JOIN retrievals t ON t.id = r.retrieval_id ORDER BY t.batch_order')
  return rows.map(({ id, result }) => {
    const { temperature, spectrum } = (typeof result === 'string' ? JSON.parse(result) : result) as { temperature: { value: number }, spectrum: { measurement: { labels: string[], pixelRange: [number, number] } } }
    const { labels, pixelRange: [first, last] } = spectrum.measurement
    return { retrievalId: id, temperature: temperature.value, labels, pixels: last - first + 1 }
  })
}

/** A whole empty service with one worker: spectra uploaded, then one batch of them all, told by one digest as by default. */
export async function runPipeline(count: number, spectrumOf: (i: number) => string, settings: object): Promise<{ seconds: number, stored: Stored[] }> {
  const stack = await createStack('pipeline')
  try {
    await startWeb(stack)
    await startWorker(stack)
    const connection = await connect(stack.databaseUrl)
    const atHand = await uploadSpectra(connection, stack.origin, 'bench', count, { spectrumOf, preference: 'digest' })
    const seconds = await timeBatch(connection, atHand, settings)
    const stored = await storedResults(connection)
    await connection.end()
    return { seconds, stored }
  }
  finally {
    await destroyStack(stack)
  }
}
