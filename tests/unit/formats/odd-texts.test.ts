import { describe, expect, it } from 'vitest'
import { bytesOf, failure, numbers, readable } from './helpers'

const utf16 = (text: string, end: 'LE' | 'BE') => {
  const codes = [0xFEFF, ...Array.from(text, char => char.charCodeAt(0))]
  return Uint8Array.from(codes.flatMap(code => end === 'LE' ? [code & 255, code >> 8] : [code >> 8, code & 255]))
}

describe('UTF-16 with a byte order mark', () => {
  it.each(['LE', 'BE'] as const)('%s is read, and it is said so, as a table and as JSON', (end) => {
    const table = utf16('wavelength (nm),flux\r\n500,1\r\n501,2\r\n', end)
    expect([numbers(table)[0], readable(table).about.axisUnit, readable(table).spectrum.warnings]).toEqual([[500, 501], 'nm', [`The file is UTF-16${end} text and was read as such.`]])
    const json = utf16(JSON.stringify({ name: 'n', axis: [500, 501], values: [1, 2] }), end)
    expect([readable(json).spectrum.format, numbers(json)[1]]).toEqual(['json', [1, 2]])
  })

  it('that ends within a character is cut off', () => {
    expect(failure(utf16('500,1\n501,2\n', 'LE').subarray(0, 23))).toMatchObject({ code: 'cut_off', message: expect.stringContaining('cut off') })
  })
})

describe('decimal commas', () => {
  it.each([['semicolons', '500,25;1,5\n500,50;2,5\n'], ['tabs', '500,25\t1,5\n500,50\t2,5\n'], ['spaces', '500,25 1,5\n500,50 2,5\n']])('between %s are read, and it is said what became of them', (_, text) => {
    expect(numbers(text)).toEqual([[500.25, 500.5], [1.5, 2.5], null])
    expect(readable(text).spectrum.warnings).toEqual(['Commas were read as decimal marks: the axis begins at 500.25.'])
  })
})

describe('values', () => {
  it('that are all zero, or never above zero, are read with a question', () => {
    expect(readable('500,0\n501,0\n').spectrum.warnings).toEqual(['All values are zero: is this the column of the intensities?'])
    expect(readable('500,-1\n501,0\n').spectrum.warnings).toEqual(['No value is above zero: is this the column of the intensities?'])
    expect(readable('500,-1\n501,1\n').spectrum.warnings).toEqual([])
  })
})

describe('a line of great length', () => {
  it('is named by its number, not taken apart', () => {
    expect(failure(`# head\n${'x'.repeat(30_000)}\n1 2\n`)).toMatchObject({ code: 'line_too_long', where: 'line 2' })
    expect(failure(`1 2\n${'3 '.repeat(20_000)}\n`)).toMatchObject({ code: 'line_too_long', where: 'line 2' })
  })

  it('as a comment is passed over', () => expect(numbers(bytesOf(`#${'x'.repeat(30_000)}\n1 2\n2 3\n`))[1]).toEqual([2, 3]))
})
