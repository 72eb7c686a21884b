import { request } from 'node:http'
import { Readable } from 'node:stream'

export const boundary = 'trotline-form'
export interface FormPart { name: string, fileName?: string, content: string | { megabytes: number } }

const block = Buffer.alloc(64 * 1024, '500.25,12.5\n')

/** The bytes of a form, made as they are sent: a large body never exists as a whole. */
export function* formBytes(parts: FormPart[]): Generator<Buffer> {
  for (const part of parts) {
    const file = part.fileName === undefined ? '' : `; filename="${part.fileName}"`
    yield Buffer.from(`--${boundary}\r\nContent-Disposition: form-data; name="${part.name}"${file}\r\n\r\n`)
    if (typeof part.content === 'string') yield Buffer.from(part.content)
    else for (let i = 0; i < part.content.megabytes * 16; i++) yield block
    yield Buffer.from('\r\n')
  }
  yield Buffer.from(`--${boundary}--\r\n`)
}

export function formLength(parts: FormPart[]): number {
  let length = 0
  for (const chunk of formBytes(parts)) length += chunk.length
  return length
}

export interface Answer { status: number, body: { files?: { field: string, name: string, bytes: number, sha256: string }[], fields?: Record<string, string>, error?: { code: string, message: string } }, milliseconds: number }

/** Sends like a plain client that goes on writing until it is answered or cut off. */
export function send(port: number, body: Iterable<Buffer>, headers: Record<string, string | number> = {}): Promise<Answer> {
  const start = performance.now()
  return new Promise((resolve, reject) => {
    const outgoing = request({ port, host: '127.0.0.1', method: 'POST', headers: { 'content-type': `multipart/form-data; boundary=${boundary}`, ...headers } }, async (response) => {
      const milliseconds = performance.now() - start
      let text = ''
      for await (const chunk of response) text += chunk
      source.destroy()
      outgoing.destroy()
      resolve({ status: response.statusCode!, body: JSON.parse(text), milliseconds })
    })
    const source = Readable.from(body)
    outgoing.on('error', reject)
    source.on('error', () => outgoing.destroy()).pipe(outgoing)
  })
}
