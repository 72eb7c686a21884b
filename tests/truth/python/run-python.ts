import { execFileSync } from 'node:child_process'
import { fileURLToPath } from 'node:url'

/** Runs a script of this folder with the system's Python (scipy is a Debian package), JSON in and out. */
export function runPython<T>(script: string, input: unknown): T {
  const path = fileURLToPath(new URL(`./${script}`, import.meta.url))
  return JSON.parse(execFileSync('/usr/bin/python3', [path], { input: JSON.stringify(input), maxBuffer: 64 * 1024 * 1024, encoding: 'utf8' })) as T
}
