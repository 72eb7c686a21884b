import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { checkApplied, SchemaError, statementsOf } from '~~/server/database/migrate'

const migration = { name: '0000_start', sql: 'CREATE TABLE a (b int);\n--> statement-breakpoint\nCREATE TABLE c (d int);\n' }
const sha256 = createHash('sha256').update(migration.sql).digest('hex')

it('a migration is split into its statements', () => {
  expect(statementsOf(migration.sql)).toEqual(['CREATE TABLE a (b int);', 'CREATE TABLE c (d int);'])
})

describe('what the database already has', () => {
  it('may be less than the code knows', () => {
    expect(() => checkApplied([], [migration])).not.toThrow()
    expect(() => checkApplied([{ name: '0000_start', sha256 }], [migration])).not.toThrow()
  })

  it('may not be newer', () => {
    expect(() => checkApplied([{ name: '0009_later', sha256 }], [migration])).toThrow(SchemaError)
  })

  it('may not have been made by another text', () => {
    expect(() => checkApplied([{ name: '0000_start', sha256: 'x' }], [migration])).toThrow(/another text/)
  })
})
