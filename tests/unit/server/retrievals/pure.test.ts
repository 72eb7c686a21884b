import { MySqlDialect } from 'drizzle-orm/mysql-core'
import type { SQL } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import type { DomainError } from '#shared/utils/domain-error'
import { keysetAfter } from '../../../../server/database/retrievals/keyset'
import type { ListedRetrieval } from '../../../../server/database/retrievals/list'
import { cursorAfter, keysetOf } from '../../../../server/services/retrievals/cursor'
import { contentHash } from '../../../../server/services/retrievals/hash'
import { isDatabaseOutage } from '../../../../server/services/retrievals/patience'
import { mergeSettings } from '../../../../server/services/retrievals/settings'

const id = '01ARZ3NDEKTSV4RRFFQ69G5FAV'
const row = (columns: Partial<ListedRetrieval>) => ({ id, observedAt: null, temperature: null, name: '', ...columns }) as ListedRetrieval
const fieldsOf = (work: () => unknown) => {
  try { work() }
  catch (error) { return (error as DomainError).fields?.map(field => field.path) }
  return 'no error'
}

describe('a cursor', () => {
  it.each([
    ['-created', row({}), null],
    ['observed', row({ observedAt: new Date('2025-01-02T03:04:05.678Z') }), new Date('2025-01-02T03:04:05.678Z')],
    ['-observed', row({}), null],
    ['temperature', row({ temperature: 187.30000000000001 }), 187.30000000000001],
    ['-name', row({ name: 'Nacht "ö" 東' }), 'Nacht "ö" 東'],
  ] as const)('comes back as the place after its row: %s', (sort, last, value) => {
    expect(keysetOf(sort, cursorAfter(sort, last))).toEqual({ sort: sort.replace('-', ''), descending: sort.startsWith('-'), after: { id, value } })
  })

  it('starts at the beginning when there is none', () => {
    expect(keysetOf('name', undefined)).toEqual({ sort: 'name', descending: false, after: null })
  })

  it.each([
    ['of another order', cursorAfter('name', row({ name: 'a' }))],
    ['cut short', cursorAfter('-created', row({})).slice(0, -6)],
    ['made up', Buffer.from('{"s":"-created","id":"short","v":null}').toString('base64url')],
    ['with an object for a value', Buffer.from(JSON.stringify({ s: '-created', id, v: { $ne: 1 } })).toString('base64url')],
  ])('is refused: %s', (_, cursor) => {
    expect(fieldsOf(() => keysetOf('-created', cursor))).toEqual(['cursor'])
  })
})

describe('the condition of the next page', () => {
  const sqlOf = (condition: SQL | undefined) => new MySqlDialect({ casing: 'snake_case' }).sqlToQuery(condition!)
  const after = (sort: 'created' | 'temperature', descending: boolean, value: number | null) => sqlOf(keysetAfter({ sort, descending, after: { id, value } }))

  it('is none on the first page', () => {
    expect(keysetAfter({ sort: 'name', descending: true, after: null })).toBeUndefined()
  })

  it('goes by the id alone in the order of creation', () => {
    expect(after('created', true, null)).toMatchObject({ sql: '`retrievals`.`id` < ?', params: [id] })
  })

  it('goes on with equal values by id, and with rows without the value, which stand last', () => {
    const { sql, params } = after('temperature', false, 190)
    expect(sql).toBe('(`retrievals`.`temperature` is null or `retrievals`.`temperature` > ? or (`retrievals`.`temperature` = ? and `retrievals`.`id` > ?))')
    expect(params).toEqual([190, 190, id])
  })

  it('stays among the rows without the value once it has reached them', () => {
    expect(after('temperature', true, null).sql).toBe('(`retrievals`.`temperature` is null and `retrievals`.`id` < ?)')
  })
})

describe('settings laid over settings', () => {
  it('take what is said, keep what is not, and fill in defaults', () => {
    const base = mergeSettings(undefined, { bands: ['3-1'], lineList: 'oh-meinel', shift: 'fixed' })
    const merged = mergeSettings(base, { shift: 'free', seed: undefined })
    expect(merged).toMatchObject({ bands: ['3-1'], lineList: 'oh-meinel', shift: 'free', seed: 1, continuumOrder: 1 })
  })

  it('replace an inner object as a whole', () => {
    expect(mergeSettings(mergeSettings(undefined, { profile: { fwhm: 0.2 } }), { profile: {} }).profile.fwhm).toBeNull()
  })

  it('are refused by the path of what is wrong', () => {
    expect(fieldsOf(() => mergeSettings(undefined, { continuumOrder: 12 }))).toEqual(['settings.continuumOrder'])
    expect(fieldsOf(() => mergeSettings(undefined, { profile: { fwhm: -1 } }))).toEqual(['settings.profile.fwhm'])
  })

  it.each(['spectrum', 'two-temperature', 'optical-depth'])('never take the method %s for another', (method) => {
    expect(fieldsOf(() => mergeSettings(undefined, { method }))).toEqual(['settings.method'])
  })
})

describe('the hash of a content', () => {
  it('does not depend on the order of keys, and does on that of items', () => {
    expect(contentHash({ a: 1, b: { c: [1, 2], d: null } })).toBe(contentHash({ b: { d: null, c: [1, 2] }, a: 1 }))
    expect(contentHash([1, 2])).not.toBe(contentHash([2, 1]))
  })

  it('tells apart what differs in one value, in its kind, or in one key', () => {
    expect(new Set([{ a: 1 }, { a: 2 }, { a: '1' }, { b: 1 }, { a: null }, { a: [1] }].map(contentHash)).size).toBe(6)
  })

  it('is SHA-256 of the JSON text', () => {
    // printf '{"a":1}' | sha256sum (GNU coreutils)
    expect(contentHash({ a: 1 })).toBe('015abd7f5cc57a2dd94b7590f04ad8084273905ee33ec5cebeae62276a97f862')
  })
})

describe('an outage of the database', () => {
  it('is known by its code, however deep it is wrapped', () => {
    const inner = Object.assign(new Error('connect'), { code: 'ECONNREFUSED' })
    expect(isDatabaseOutage(new Error('query failed', { cause: new Error('again', { cause: inner }) }))).toBe(true)
    expect(isDatabaseOutage(Object.assign(new Error('lock'), { code: 'ER_LOCK_DEADLOCK' }))).toBe(true)
  })

  it('is not what is wrong with the query or the data', () => {
    expect(isDatabaseOutage(Object.assign(new Error('dup'), { code: 'ER_DUP_ENTRY' }))).toBe(false)
    expect(isDatabaseOutage('text')).toBe(false)
  })
})
