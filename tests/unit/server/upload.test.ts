import { execFile } from 'node:child_process'
import { createHash } from 'node:crypto'
import { open, rm, truncate } from 'node:fs/promises'
import { connect } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { boundary, formBytes, formLength, send } from './upload-helpers/form-body'
import { startFormServer } from './upload-helpers/form-server'

const MEGABYTE = 1024 * 1024
let server: Awaited<ReturnType<typeof startFormServer>>
beforeAll(async () => { server = await startFormServer() })
afterAll(() => server.stop())

/** The highest resident memory over its start while the work runs, in bytes. */
async function memoryRise(work: () => Promise<unknown>): Promise<number> {
  const start = process.memoryUsage.rss()
  let highest = start
  const timer = setInterval(() => { highest = Math.max(highest, process.memoryUsage.rss()) }, 10)
  await work().finally(() => clearInterval(timer))
  return highest - start
}

describe('a form that is received', () => {
  it('gives every file with its name, size and SHA-256, and the fields', async () => {
    const answer = await send(server.port, formBytes([
      { name: 'about', content: '{"medium":"air"}' },
      { name: 'files', fileName: 'night.csv', content: '500,1\n501,2\n' },
      { name: 'files', fileName: 'Ångström.txt', content: '' },
    ]))
    expect(answer.status).toBe(200)
    expect(answer.body.fields).toEqual({ about: '{"medium":"air"}' })
    const hash = (text: string) => createHash('sha256').update(text).digest('hex')
    expect(answer.body.files).toMatchObject([
      { field: 'files', name: 'night.csv', bytes: 12, sha256: hash('500,1\n501,2\n') },
      { field: 'files', name: 'Ångström.txt', bytes: 0, sha256: hash('') },
    ])
  })

  it('keeps only the last part of a file name, so that no name is a path', async () => {
    const answer = await send(server.port, formBytes([{ name: 'files', fileName: '../../etc/passwd', content: 'x' }, { name: 'files', fileName: '', content: 'y' }]))
    expect(answer.body.files?.map(file => file.name)).toEqual(['passwd', 'file-2'])
  })

  it('takes 200 files of 1 MB in one request and stays under 200 MB over idle', async () => {
    const parts = Array.from({ length: 200 }, (_, index) => ({ name: 'files', fileName: `${index}.csv`, content: { megabytes: 1 } }))
    let files = 0
    const rise = await memoryRise(async () => {
      const answer = await send(server.port, formBytes(parts), { 'content-length': formLength(parts) })
      files = answer.body.files!.length
      expect(new Set(answer.body.files!.map(file => file.sha256)).size).toBe(1)
    })
    expect(files).toBe(200)
    expect(rise).toBeLessThan(200 * MEGABYTE)
    expect(await server.leftovers()).toEqual([])
  })
})

describe('a form that is too large', () => {
  const oneFile = [{ name: 'files', fileName: 'big.csv', content: { megabytes: 100 } }]

  it.each([['with', { 'content-length': formLength(oneFile) }], ['without', {}]])('a file of 100 MB %s Content-Length is answered 413 in under 2 s with memory flat and nothing left on the disk', async (_, headers) => {
    const rise = await memoryRise(async () => {
      const answer = await send(server.port, formBytes(oneFile), headers)
      expect(answer.status).toBe(413)
      expect(answer.body.error).toMatchObject({ code: 'payload_too_large', message: expect.stringContaining('32 MB') })
      expect(answer.milliseconds).toBeLessThan(2000)
    })
    expect(rise).toBeLessThan(60 * MEGABYTE)
    expect(await server.leftovers()).toEqual([])
  })

  it('a Content-Length over the limit is answered 413 before one byte of the body came', async () => {
    const status = await new Promise<string>((resolve) => {
      const socket = connect(server.port, '127.0.0.1', () => socket.write(`POST / HTTP/1.1\r\nHost: x\r\nContent-Type: multipart/form-data; boundary=${boundary}\r\nContent-Length: ${300 * MEGABYTE}\r\n\r\n`))
      socket.once('data', (data) => { resolve(data.toString().split('\r\n')[0]!); socket.destroy() })
    })
    expect(status).toBe('HTTP/1.1 413 Payload Too Large')
  })

  it('a stream of small files without Content-Length ends at 256 MB', async () => {
    const parts = Array.from({ length: 150 }, (_, index) => ({ name: 'files', fileName: `${index}.csv`, content: { megabytes: 2 } }))
    const answer = await send(server.port, formBytes(parts))
    expect([answer.status, answer.body.error?.message]).toEqual([413, 'One request takes at most 256 MB. Send the files in several requests.'])
    expect(await server.leftovers()).toEqual([])
  })

  it('curl sees the 413 for a file of 100 MB, with and without Expect: 100-continue', async () => {
    const path = join(tmpdir(), `big-${process.pid}.csv`)
    await (await open(path, 'w')).close()
    await truncate(path, 100 * MEGABYTE)
    try {
      for (const expectation of ['Expect: 100-continue', 'Expect:']) {
        const { stdout } = await promisify(execFile)('curl', ['-s', '-S', '-H', expectation, '-F', `files=@${path}`, '-w', '\n%{http_code} %{time_total}', `http://127.0.0.1:${server.port}/`])
        const [body, tail] = stdout.split('\n')
        expect(JSON.parse(body!).error.code).toBe('payload_too_large')
        expect(tail).toMatch(/^413 [01]\./)
      }
    }
    finally {
      await rm(path)
    }
  })

  it('more files, more fields or a longer field than allowed are 413', async () => {
    const many = (count: number, part: object) => Array.from({ length: count }, () => ({ name: 'a', content: 'x', ...part }))
    expect((await send(server.port, formBytes(many(201, { fileName: 'a.csv' })))).body.error?.message).toContain('200 files')
    expect((await send(server.port, formBytes(many(11, {})))).body.error?.message).toContain('10 fields')
    expect((await send(server.port, formBytes([{ name: 'about', content: 'x'.repeat(70_000) }]))).body.error?.message).toContain('"about"')
    expect(await server.leftovers()).toEqual([])
  })
})

describe('a form that is broken', () => {
  it('another content type is 415', async () => {
    for (const type of ['application/json', 'application/x-www-form-urlencoded', 'multipart/mixed; boundary=x']) {
      const answer = await send(server.port, [Buffer.from('{}')], { 'content-type': type })
      expect([answer.status, answer.body.error?.code]).toEqual([415, 'unsupported_media_type'])
    }
  })

  it('no boundary, no file, and a body that ends too early are 400 and leave nothing', async () => {
    const cases: [Iterable<Buffer>, Record<string, string>][] = [
      [formBytes([]), { 'content-type': 'multipart/form-data' }],
      [formBytes([{ name: 'about', content: 'x' }]), {}],
      [[Buffer.from(`--${boundary}\r\nContent-Disposition: form-data; name="files"; filename="a.csv"\r\n\r\n500,1`)], {}],
      [[Buffer.from('no form at all')], {}],
      [[], {}],
    ]
    for (const [body, headers] of cases) {
      const answer = await send(server.port, body, headers)
      expect([answer.status, answer.body.error?.code]).toEqual([400, 'malformed_upload'])
    }
    expect(await server.leftovers()).toEqual([])
  })

  it('a client that goes away in the middle leaves no temporary file', async () => {
    const socket = connect(server.port, '127.0.0.1')
    socket.write(`POST / HTTP/1.1\r\nHost: x\r\nContent-Type: multipart/form-data; boundary=${boundary}\r\nContent-Length: 5000000\r\n\r\n--${boundary}\r\nContent-Disposition: form-data; name="files"; filename="a.csv"\r\n\r\n500,1\n`)
    await expect.poll(() => server.leftovers()).toHaveLength(1)
    socket.destroy()
    await expect.poll(() => server.leftovers()).toEqual([])
  })
})
