import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, expect, it } from 'vitest'
import { readOrCreate } from '~~/server/secrets'

const folder = mkdtempSync(join(tmpdir(), 'trotline-secrets-'))
afterAll(() => rmSync(folder, { recursive: true }))

it('a secret is made once, is the same ever after, and only its owner reads it', () => {
  const made = readOrCreate(folder, 'auth')
  expect(made.length).toBeGreaterThanOrEqual(64)
  expect(readOrCreate(folder, 'auth')).toBe(made)
  expect(readFileSync(join(folder, 'auth'), 'utf8')).toBe(made)
  expect(statSync(join(folder, 'auth')).mode & 0o777).toBe(0o600)
})

it('a cut-off secret is refused, not used', () => {
  writeFileSync(join(folder, 'short'), 'abc')
  expect(() => readOrCreate(folder, 'short')).toThrow(/too short/)
})
