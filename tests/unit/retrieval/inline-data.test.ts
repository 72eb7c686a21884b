import { describe, expect, it } from 'vitest'
import { fromTable, inputOf, problemsOf } from './helpers'

const complete = { wavenumber: 4, termUpper: 12, termLower: 8, gUpper: 5, gLower: 3, A: 1e-7, scatteredWavenumber: 18700, spinWeight: 6, J: 2, branch: 'stokes' }
type Field = keyof typeof complete

/** A two-line table with its data inline, without some fields. */
const table = (observable: string, without: Field[] = [], more: object = {}) => {
  const given = Object.fromEntries(Object.entries(complete).filter(([key]) => !without.includes(key as Field)))
  return { observable, widthIn: 'wavelength', signalIn: 'photons', ...more, lines: ['a', 'b'].map(label => ({ label, intensity: 1, sigma: 0.1, ...given })) }
}
const paths = (...given: Parameters<typeof table>) => problemsOf(fromTable(table(...given), {}, null)).map(({ path }) => path)

/** What the formula of each observable holds (design of the line model); a term counts as known when its partner and the wavenumber are. */
const needs: [string, Field[], object?][] = [
  ['photon-emission', ['gUpper', 'A']],
  ['energy-emission', ['wavenumber', 'gUpper', 'A']],
  ['brightness-integral', ['wavenumber', 'gUpper', 'A']],
  ['absorption-area', ['wavenumber', 'gUpper', 'A']],
  ['optical-depth-integral', ['wavenumber', 'gUpper', 'A']],
  ['equivalent-width', ['wavenumber', 'gUpper', 'A']],
  ['level-population', ['gUpper']],
  ['level-population', [], { populationPer: 'state' }],
  ['raman-scatter', ['scatteredWavenumber', 'spinWeight', 'J', 'branch']],
  ['envelope-only', ['gUpper']],
]

describe.each(needs)('%s', (observable, fields, more = {}) => {
  it('takes a table that has everything', () => {
    expect(inputOf(fromTable(table(observable, [], more), {}, null)).lines).toHaveLength(2)
  })

  it('says each number that a line lacks, by its path', () => {
    for (const field of fields) expect(paths(observable, [field], more), field).toEqual([`lines.0.${field}`, `lines.1.${field}`])
  })

  it('asks for an energy when neither term is given', () => {
    expect(paths(observable, ['termUpper', 'termLower'], more).every(path => /^lines\.[01]\.term(Upper|Lower)$/.test(path))).toBe(true)
  })

  it('does not ask for what it does not use', () => {
    const unused = (Object.keys(complete) as Field[]).filter(field => !fields.includes(field) && !['wavenumber', 'termUpper', 'termLower'].includes(field))
    expect(inputOf(fromTable(table(observable, unused, more), {}, null)).lines).toHaveLength(2)
  })
})

describe('a line with its data', () => {
  it('may give one term and the wavenumber instead of both terms', () => {
    for (const field of ['termUpper', 'termLower'] as const) {
      const [line] = inputOf(fromTable(table('absorption-area', [field]), {}, null)).lines
      expect(line.components[0]).toMatchObject({ wavenumber: 4, termUpper: 12, termLower: 8, einsteinA: 1e-7 })
    }
  })

  it('has a problem that names the observable, the field and the way out', () => {
    expect(problemsOf(fromTable(table('photon-emission', ['A']), {}, null))[0].message).toBe('a: photon-emission needs termUpper, gUpper, A; A is missing. Give it with the line, or name a line list.')
  })

  it('carries the band of the line or of the table, and no strength set', () => {
    const input = inputOf(fromTable({ ...table('photon-emission'), band: 'v1' }, {}, null))
    expect([input.lines[0].band, input.strengthSet, input.alternatives]).toEqual(['v1', null, []])
    expect(input.cautions!.join(' ')).toContain('Line strengths are those given with the lines')
  })
})
