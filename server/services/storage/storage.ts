import type { Readable } from 'node:stream'

/** Bytes by their SHA-256 within a campaign. Two campaigns never share an object, so that deleting one cannot touch the other. */
export interface Storage {
  /** Takes over a finished temporary file (it is moved away). Says whether the campaign had these bytes already. */
  putFromFile(campaignId: string, sha256: string, temporaryPath: string): Promise<{ existed: boolean }>
  put(campaignId: string, sha256: string, bytes: Uint8Array): Promise<{ existed: boolean }>
  /** Throws `not_found` when there is no such object. */
  open(campaignId: string, sha256: string): Promise<{ stream: Readable, bytes: number }>
  read(campaignId: string, sha256: string): Promise<Buffer>
  exists(campaignId: string, sha256: string): Promise<boolean>
  /** Removing what is not there is no error. */
  remove(campaignId: string, sha256: string): Promise<void>
  /** Throws when nothing can be written: for the readiness answer. */
  check(): Promise<void>
  /** Bytes of the place it is in; null where that is not known. */
  space(): Promise<{ free: number, total: number } | null>
}
