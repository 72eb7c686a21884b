import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readLineTable } from '../../../shared/formats/line-table-text/read-line-table'

const lines = (text: string) => {
  const reading = readLineTable(text)
  if (!reading.ok) throw new Error(JSON.stringify(reading.problems))
  return reading.lines
}
const problems = (text: string) => {
  const reading = readLineTable(text)
  return reading.ok ? [] : reading.problems.map(({ row, field, message }) => `${row} ${field ?? ''} ${message}`)
}

describe('a pasted line table', () => {
  it.each([
    ['commas', 'label,intensity,sigma\nP1(2),812.4,8\nP1(3),760,8.5\n'],
    ['tabs, as a spreadsheet pastes', 'Label\tIntensity\tSigma\r\nP1(2)\t812,4\t8\r\nP1(3)\t760\t8,5\r\n'],
    ['semicolons and decimal commas', 'label;intensity;sigma\nP1(2);812,4;8\nP1(3);760;8,5'],
    ['spaces', ' label  intensity  sigma\n P1(2)  812.4  8\n\n# weak\n P1(3)  760  8.5'],
    ['other names in another order', 'err,line,flux (R)\n8,P1(2),812.4\n8.5,P1(3),760'],
    ['no heading', 'P1(2) 812.4 8\nP1(3) 760 8.5'],
  ])('with %s', (_, text) => {
    expect(lines(text)).toEqual([{ label: 'P1(2)', intensity: 812.4, sigma: 8 }, { label: 'P1(3)', intensity: 760, sigma: 8.5 }])
  })

  it('without a heading says what its columns were taken for', () => {
    expect(readLineTable('P1(2) 812.4')).toMatchObject({ ok: true, warnings: ['The table has no heading; its columns were read as label, intensity.'] })
  })

  it('carries molecular data, and leaves out what is empty', () => {
    // 1-0 of CO: invented intensity; wavenumber, term and A rounded, from memory.
    expect(lines('label,intensity,sigma,wavenumber (cm-1),E_upper [cm-1],g_upper,A\n1-0,4.1,,3.845,3.845,3,7.2E-8')).toEqual([{ label: '1-0', intensity: 4.1, wavenumber: 3.845, termUpper: 3.845, gUpper: 3, A: 7.2e-8 }])
  })

  it('says row by row what is wrong', () => {
    expect(problems('label,intensity,sigma\nP1(2),8x,8\nP1(3),,8\nP1(4),5,0\n,5,1\nP1(5),NaN,1\nP1(6),5,1,7\nP1(7),5,-1')).toEqual([
      '2 intensity Row 2, intensity: "8x" is not a finite number.',
      '3 intensity Row 3, intensity: is empty.',
      '4 sigma Row 4, sigma: sigma must be greater than zero; leave it out when it is not known.',
      '5 label Row 5, label: is empty.',
      '6 intensity Row 6, intensity: "NaN" is not a finite number.',
      '7  Row 7 has 4 columns, the heading 3.',
      '8 sigma Row 8, sigma: sigma must be greater than zero; leave it out when it is not known.',
    ])
  })

  it('refuses a line that stands twice in a band, and takes it in two bands', () => {
    expect(problems('label,intensity\nP1(2),1\nP1(2),2')).toEqual(['3 label Row 3: P1(2) stands already in row 2.'])
    expect(lines('band,label,intensity\n3-1,P1(2),1\n4-2,P1(2),2')).toHaveLength(2)
  })

  it.each([
    ['', /empty/],
    ['label,intensity\n', /no line/],
    ['label,sigma\nP1(2),1', /no column intensity/],
    ['label,intensity,colour\nP1(2),1,red', /"colour" is not a column/],
    ['label,intensity,flux\nP1(2),1,2', /Two columns are intensity/],
    ['label,intensity,E_upper (K)\nP1(2),1,5.5', /given in cm-1/],
    ['P1(2),1,2,3', /needs a heading/],
  ])('%j is refused', (text, message) => {
    expect(problems(text).join()).toMatch(message)
  })

  it('takes 2000 lines and refuses one more', () => {
    const table = (count: number) => `label,intensity\n${Array.from({ length: count }, (_, i) => `L${i},1`).join('\n')}`
    expect(lines(table(2000))).toHaveLength(2000)
    expect(problems(table(2001))).toEqual(['2002  A table takes at most 2000 lines.'])
  })

  it('never throws', () => {
    fc.assert(fc.property(fc.string({ unit: fc.constantFrom(...'label intensity\t\n,;0123.()[]"'), maxLength: 100 }), text => typeof readLineTable(text).ok === 'boolean'), { numRuns: 1000 })
  })
})
