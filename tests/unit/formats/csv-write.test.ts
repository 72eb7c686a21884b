import { parse } from 'csv-parse/sync'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { csvRow, csvRows } from '../../../shared/formats/csv-write'

describe('a CSV row', () => {
  it('keeps numbers as numbers in full precision, also negative ones', () => {
    expect(csvRow([187.4, -0.1, 1e-30, 0.1 + 0.2, null, undefined, Number.NaN, Infinity, true])).toBe('187.4,-0.1,1e-30,0.30000000000000004,,,,,true\r\n')
  })

  it('makes text that begins like a formula harmless', () => {
    for (const text of ['=1+1', '+1', '-1', '@SUM(A1)', '\t=1', '\r=1', ' =1', '＝1']) expect(csvRow([text]).replace(/^"/, '')).toMatch(/^'/)
  })

  it('gives text back unchanged through another program, quotes and line ends included', () => {
    fc.assert(fc.property(fc.array(fc.string().filter(text => !/^\s*[=+\-@\t\r＝＋－＠]/.test(text)), { minLength: 2, maxLength: 5 }), (cells) => {
      expect(parse(csvRow(cells))).toEqual([cells])
    }))
  })

  it('writes times in UTC', () => {
    expect(csvRow([new Date(0)])).toBe('1970-01-01T00:00:00.000Z\r\n')
  })

  it('streams a heading and rows', async () => {
    let text = ''
    for await (const row of csvRows(['name', 'T'], [['a', 1], ['b, c', 2]])) text += row
    expect(text).toBe('name,T\r\na,1\r\n"b, c",2\r\n')
  })
})
