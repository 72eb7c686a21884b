import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { config } from './config'

const known = new Map<string, string>()

/** A secret of this installation: made once, kept in a file that only its owner reads, shared by all its processes. */
export function secret(name: string): string {
  const found = known.get(name)
  if (found) return found
  const value = readOrCreate(config().secretsDir, name)
  known.set(name, value)
  return value
}

export function readOrCreate(directory: string, name: string): string {
  const path = join(directory, name)
  mkdirSync(directory, { recursive: true, mode: 0o700 })
  try {
    // 'wx' lets exactly one of several starting processes win; the others read its value.
    writeFileSync(path, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' })
  }
  catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
  }
  const value = readFileSync(path, 'utf8').trim()
  if (value.length < 32) throw new Error(`The secret ${name} is too short; remove the file to have it made again.`)
  return value
}
