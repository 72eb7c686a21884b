import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'

/** Bytes of a reference file; the path counts from tests/truth. */
export function referenceBytes(path: string): Uint8Array {
  return readFileSync(fileURLToPath(new URL(`../${path}`, import.meta.url)))
}

/** Lines of a reference text without empty ones and those that begin with #. */
export function referenceLines(path: string): string[] {
  return new TextDecoder('latin1').decode(referenceBytes(path)).split(/\r?\n/).filter(line => line.trim() !== '' && !line.startsWith('#'))
}
