import { createHash } from 'node:crypto'
import { open } from 'node:fs/promises'
import { join } from 'node:path'
import type { BusboyFileStream } from '@fastify/busboy'
import { maxFileName, withoutControls } from '../../../shared/utils/plain-text'

export interface ReceivedFile {
  /** The form field it came in. */
  field: string
  name: string
  /** What became of its name, in words. */
  notes: string[]
  path: string
  bytes: number
  sha256: string
}

/** One file of the form into a temporary file, hashed on the way. */
export async function storePart(part: BusboyFileStream, about: { field: string, name: string, notes: string[], number: number, directory: string }): Promise<ReceivedFile> {
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
  return { field: about.field, name: about.name, notes: about.notes, path, bytes, sha256: hash.digest('hex') }
}

/** The last part of a name, without control characters: it is shown, never used as a path. */
export function cleanName(given: string | undefined, number: number): { name: string, notes: string[] } {
  const last = (given ?? '').split(/[/\\]/).at(-1)!
  const clean = withoutControls(last).trim()
  const name = clean.slice(0, maxFileName).replace(/[\uD800-\uDBFF]$/, '').trim()
  const notes = clean.length > maxFileName ? [`The file's name was cut to ${maxFileName} characters.`] : []
  return { name: name || `file-${number}`, notes }
}
