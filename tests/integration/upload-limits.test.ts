import { request } from 'node:http'
import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { rowsOf } from '../helpers/accounts'
import { database, origin, twoCampaigns, webMemory, type TwoCampaigns } from '../helpers/shared-service'
import { fullAbout, spectrumText, upload } from '../helpers/upload'
import { sleep } from '../helpers/stack'

let connection: Connection
let at: TwoCampaigns

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'limits')
})
afterAll(() => connection.end())

const megabyte = 1024 * 1024

/** The highest memory of the web process while something runs. */
async function peakMemory<T>(work: Promise<T>): Promise<{ answer: T, peak: number }> {
  let running = true
  let peak = webMemory()
  const watch = (async () => {
    while (running) {
      peak = Math.max(peak, webMemory())
      await sleep(20)
    }
  })()
  const answer = await work.finally(() => running = false)
  await watch
  return { answer, peak }
}

/** Sends one file of `total` bytes without a Content-Length, as fast as it is taken; ends with the answer. */
function stream(total: number, token: string): Promise<{ status: number, text: string }> {
  return new Promise((done, failed) => {
    const headers = { 'authorization': `Bearer ${token}`, 'content-type': 'multipart/form-data; boundary=edge', 'transfer-encoding': 'chunked' }
    const outgoing = request(`${origin()}/api/campaigns/${at.slug}/spectra`, { method: 'POST', headers })
    let answered = false
    outgoing.on('response', (response) => {
      answered = true
      let text = ''
      response.on('data', chunk => text += chunk).on('end', () => done({ status: response.statusCode!, text }))
    })
    outgoing.on('error', error => answered || failed(error))
    outgoing.write('--edge\r\ncontent-disposition: form-data; name="files"; filename="huge.csv"\r\n\r\n')
    const chunk = Buffer.alloc(megabyte, '1 2\n')
    let sent = 0
    const more = (): void => {
      while (sent < total && !answered) {
        sent += chunk.length
        if (!outgoing.write(chunk)) return void outgoing.once('drain', more)
      }
      outgoing.end('\r\n--edge--\r\n')
    }
    more()
  })
}

describe('limits of an upload', () => {
  it('a file of 100 MB is refused within two seconds, with memory flat', async () => {
    const idle = webMemory()
    const started = performance.now()
    const { answer, peak } = await peakMemory(stream(100 * megabyte, at.observer.token))
    expect([answer.status, JSON.parse(answer.text).error.code]).toEqual([413, 'payload_too_large'])
    expect(performance.now() - started).toBeLessThan(2000)
    expect(peak - idle).toBeLessThan(80)
  })

  it('whoever may not upload here is refused before the body is read', async () => {
    const started = performance.now()
    const { status } = await stream(100 * megabyte, at.stranger.token)
    expect(status).toBe(404)
    expect(performance.now() - started).toBeLessThan(2000)
  })

  it('two hundred files of 1 MB in one request stay under 200 MB over idle, and are all there', async () => {
    const idle = webMemory()
    const padding = `# ${'.'.repeat(76)}\n`.repeat(Math.floor((megabyte - 40_000) / 79))
    const files = Array.from({ length: 200 }, (_, i) => ({ name: `many-${i}.csv`, content: `${padding}${spectrumText(1024, 100 + i)}` }))
    expect(files[0]!.content.length).toBeGreaterThan(0.97 * megabyte)
    const { answer, peak } = await peakMemory(upload(at.observer, at.slug, files, fullAbout))
    expect([answer.status, answer.items.length, answer.items.filter(item => !item.ok)]).toEqual([207, 200, []])
    expect(peak - idle).toBeLessThan(200)
    expect(await rowsOf(connection, 'SELECT id FROM spectra WHERE name LIKE \'many-%\'')).toHaveLength(200)
  })

  it('a two hundred and first file is refused, and nothing of its request is kept', async () => {
    const files = Array.from({ length: 201 }, (_, i) => ({ name: `over-${i}.csv`, content: spectrumText(10, 1000 + i) }))
    expect((await upload(at.observer, at.slug, files, fullAbout)).status).toBe(413)
    expect(await rowsOf(connection, 'SELECT id FROM spectra WHERE name LIKE \'over-%\'')).toHaveLength(0)
  })

  it('a JSON body over 8 MB, and a body of another kind, are refused', async () => {
    const values = Array.from({ length: 900_000 }, (_, i) => i + 0.123456)
    expect((await at.observer.call('POST', `/api/campaigns/${at.slug}/spectra`, { name: 'big', axis: values, values })).status).toBe(413)
    const plain = await fetch(`${origin()}/api/campaigns/${at.slug}/spectra`, { method: 'POST', headers: { 'authorization': `Bearer ${at.observer.token}`, 'content-type': 'text/plain' }, body: '1 2' })
    expect(plain.status).toBe(415)
  })
})
