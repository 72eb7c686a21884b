import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bytesOf, numbers, read, readable } from './helpers'

describe('a text table is read', () => {
  const expected = [[500.5, 501], [1, 2.5], null]
  it.each([
    ['commas', '500.5,1\n501,2.5\n'],
    ['commas and spaces', '500.5, 1\n 501 , 2.5'],
    ['semicolons', '500.5;1\n501;2.5\n'],
    ['tabs', '500.5\t1\n501\t2.5\n'],
    ['spaces', '  500.5   1\n  501     2.5  \n'],
    ['CRLF and lone CR', '500.5,1\r\n501,2.5\r'],
    ['a byte order mark', '\uFEFF500.5,1\n501,2.5\n'],
    ['comments and blank lines', '# night 12\n! x\n% y\n; z\n\n500.5,1\n# in between\n501,2.5\n\n'],
    ['quotes', '"500.5","1"\n"501","2.5"\n'],
    ['a trailing separator', '500.5,1,\n501,2.5,\n'],
    ['exponents as C and Fortran write them', '5.005E+02 1d0\n501 25.D-1\n'],
    ['decimal commas between semicolons', '500,5;1\n501;2,5\n'],
    ['decimal commas between spaces', '500,5 1\n501 2,5\n'],
    ['decimal commas between tabs', '500,5\t1,0\n501,0\t2,5\n'],
  ])('with %s', (_, text) => {
    expect(numbers(text)).toEqual(expected)
  })

  it('saying so when commas were decimal marks', () => {
    expect(readable('500,5;1\n501;2,5\n').spectrum.warnings).toEqual(['Commas were read as decimal marks: the axis begins at 500.5.'])
  })

  it('when it is UTF-16 with a byte order mark, and says so', () => {
    for (const [mark, little] of [[[0xFF, 0xFE], true], [[0xFE, 0xFF], false]] as const) {
      const units = new DataView(new ArrayBuffer(24))
      Array.from('500.5,1\n501,').forEach((char, i) => units.setUint16(2 * i, char.charCodeAt(0), little))
      const rest = little ? [0x32, 0] : [0, 0x32]
      const { spectrum } = readable(Uint8Array.from([...mark, ...new Uint8Array(units.buffer), ...rest]))
      expect([...spectrum.values]).toEqual([1, 2])
      expect(spectrum.warnings[0]).toContain('UTF-16')
    }
  })

  it('when it is Latin-1, and says so', () => {
    const latin1 = Uint8Array.from('wavelength (Å),flux\n5000,1\n5001,2\n', char => char.charCodeAt(0))
    const { spectrum, about } = readable(latin1)
    expect([about.axisUnit, spectrum.warnings]).toEqual(['angstrom', ['The file is not UTF-8; it was read as Latin-1 text.']])
  })

  it('whatever its name ends with', () => {
    expect(read('500,1\n501,2').ok).toBe(true)
  })

  it('descending as well as ascending, in the order of the file', () => {
    expect(numbers('502,1\n501,2\n500,3\n')).toEqual([[502, 501, 500], [1, 2, 3], null])
  })

  it('to the same double as Number() gives, for any number', () => {
    fc.assert(fc.property(fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 2, maxLength: 20 }), (values) => {
      const text = values.map((value, index) => `${index},${value}`).join('\n')
      expect(numbers(text)[1]).toEqual(values.map(value => Number(String(value))))
    }))
  })

  it('never throws, whatever the bytes', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 300 }), bytes => typeof read(bytes).ok === 'boolean'), { numRuns: 300 })
    fc.assert(fc.property(fc.string({ unit: fc.constantFrom(...'0159.,;\t \n"#eE-+na()[]{}x'), maxLength: 80 }), text => typeof read(text).ok === 'boolean'), { numRuns: 2000 })
  })

  it('with 1,000,000 rows in under two seconds, and one row more is refused', () => {
    const row = (i: number) => `${1500 + i * 0.001},${(i * 7919) % 1000}.25,1.5\n`
    const text = Array.from({ length: 1_000_000 }, (_, i) => row(i)).join('')
    const bytes = bytesOf(text)
    const start = performance.now()
    expect(readable(bytes).spectrum.axis.length).toBe(1_000_000)
    expect(performance.now() - start).toBeLessThan(2000)
    const outcome = read(bytesOf(`${text}${row(1_000_000)}`))
    expect(outcome).toMatchObject({ ok: false, error: { code: 'too_many_pixels' } })
  })
})
