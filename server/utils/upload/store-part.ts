import { createHash } from 'node:crypto'
import { open } from 'node:fs/promises'
import { join } from 'node:path'
import type { BusboyFileStream } from '@fastify/busboy'

export interface ReceivedFile {
  /** The form field it came in. */
  field: string
  name: string
  path: string
  bytes: number
  sha256: string
}

/** One file of the form into a temporary file, hashed on the way. */
export async function storePart(part: BusboyFileStream, about: { field: string, name: string, number: number, directory: string }): Promise<ReceivedFile> {
  const path = join(about.directory, `${about.number}.part`)
  const hash = createHash('sha256')
  let bytes = 0
  const handle = await open(path, 'wx', 0o600)
  try {
    for await (const chunk of part) {
      hash.update(chunk)
      bytes += chunk.length
      await handle.writeFile(chunk)
    }
  }
  finally {
    await handle.close()
  }
  return { field: about.field, name: about.name, path, bytes, sha256: hash.digest('hex') }
}

/** The last part of a name, without control characters: it is shown, never used as a path. */
export function cleanName(name: string | undefined, number: number): string {
  // eslint-disable-next-line no-control-regex
  const clean = (name ?? '').replace(/[\u0000-\u001F\u007F]/g, '').split(/[/\\]/).at(-1)!.trim().slice(0, 200)
  return clean || `file-${number}`
}
