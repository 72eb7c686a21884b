import { getHeader, setResponseHeader, type H3Event } from 'h3'
import { DomainError } from '#shared/utils/domain-error'
import { config } from '../config'

/** Reads a JSON body without ever holding more than the limit in memory. */
export async function readJson(event: H3Event, limit = config().limits.jsonBytes): Promise<unknown> {
  const type = getHeader(event, 'content-type') ?? ''
  const text = (await readBytes(event, limit)).toString('utf8')
  if (!text.trim()) return {}
  if (!/^application\/([a-z0-9.-]+\+)?json\s*(;|$)/i.test(type)) throw new DomainError('unsupported_media_type', 'Send the body as application/json.')
  try {
    return JSON.parse(text)
  }
  catch (error) {
    throw new DomainError('bad_request', `The body is not valid JSON: ${(error as Error).message}`)
  }
}

async function readBytes(event: H3Event, limit: number): Promise<Buffer> {
  if (Number(getHeader(event, 'content-length') ?? 0) > limit) throw tooLarge(event, limit)
  const chunks: Buffer[] = []
  let size = 0
  for await (const chunk of event.node.req) {
    size += (chunk as Buffer).length
    if (size > limit) throw tooLarge(event, limit)
    chunks.push(chunk as Buffer)
  }
  return Buffer.concat(chunks)
}

function tooLarge(event: H3Event, limit: number): DomainError {
  // The rest of the body is not read: the connection must not be used again.
  setResponseHeader(event, 'connection', 'close')
  return new DomainError('payload_too_large', `A JSON body takes at most ${Math.floor(limit / 1024 / 1024)} MB; send large spectra as files.`)
}
