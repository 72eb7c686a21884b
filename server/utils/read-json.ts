import { getHeader, setResponseHeader, type H3Event } from 'h3'
import { JsonProblem, parseStrictJson } from '#shared/formats/strict-json'
import { DomainError } from '#shared/utils/domain-error'
import { config } from '../config'
import { refuseEncoded } from './content-encoding'

export const isJsonType = (type: string | undefined): boolean => /^application\/([a-z0-9.-]+\+)?json\s*(;|$)/i.test(type ?? '')

/** Reads a JSON body without ever holding more than the limit in memory. */
export async function readJson(event: H3Event): Promise<unknown> {
  const text = textOf(await readBytes(event))
  if (!text.trim()) return {}
  if (!isJsonType(getHeader(event, 'content-type'))) throw new DomainError('unsupported_media_type', 'Send the body as application/json.')
  try {
    return parseStrictJson(text)
  }
  catch (error) {
    if (!(error instanceof JsonProblem)) throw error
    throw new DomainError('bad_request', `The body cannot be taken as JSON. ${error.path ? `${error.path}: ` : ''}${error.message}`, error.path ? [{ path: error.path, message: error.message }] : undefined)
  }
}

function textOf(bytes: Buffer): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  }
  catch {
    throw new DomainError('bad_request', 'The body is not UTF-8 text, which JSON always is. Save or send it as UTF-8.')
  }
}

export async function readBytes(event: H3Event, limit = config().limits.jsonBytes): Promise<Buffer> {
  refuseEncoded(event.node.req)
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
