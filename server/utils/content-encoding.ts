import type { IncomingMessage } from 'node:http'
import { DomainError } from '../../shared/utils/domain-error'

/** A packed body could unpack to any size, so it is not unpacked at all. */
export function refuseEncoded({ headers }: IncomingMessage): void {
  const encoding = (headers['content-encoding'] ?? 'identity').trim().toLowerCase()
  if (encoding === '' || encoding === 'identity') return
  throw new DomainError('unsupported_media_type', `The body is packed (Content-Encoding: ${encoding.slice(0, 40)}), which is not taken here. Send it unpacked, without that header.`)
}
