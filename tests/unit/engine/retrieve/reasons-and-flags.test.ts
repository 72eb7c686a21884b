import { describe, expect, it } from 'vitest'
import { bitsToFlags, flagsToBits, flagWords, orderedFlags } from '#shared/engine/flags'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { flagNames } from '#shared/engine/types'
import type { FlagName, LineRetrievalInput, MeasuredLine } from '#shared/engine/types'
import { seededNormal } from '../helpers/random'
import { rotorLines, syntheticInput } from '../helpers/tables'

const table = (count = 6, relative = 0.02, temperature = 60) => syntheticInput({ temperature, lines: rotorLines(count, 1.93), relative, normal: seededNormal(5) })
const change = (input: LineRetrievalInput, edit: (line: MeasuredLine, i: number) => Partial<MeasuredLine>): LineRetrievalInput =>
  ({ ...input, lines: input.lines.map((line, i) => ({ ...line, ...edit(line, i) })) })
const flagsOf = (input: LineRetrievalInput) => retrieveFromLines(input).flags

describe('a failed retrieval says why', () => {
  it.each<[string, LineRetrievalInput, RegExp]>([
    ['no line is used', change(table(), () => ({ used: false })), /^No line is used/],
    ['the table is empty', { ...table(), lines: [] }, /^No line is used/],
    ['one line is used', change(table(), (_, i) => ({ used: i === 2 })), /^One line alone/],
    ['every intensity is negative', change(table(), line => ({ intensity: -line.intensity })), /positive intensity/],
    ['intensities rise like no temperature', change(table(), (line, i) => ({ intensity: line.intensity * 40 ** i, sigma: 1e-3 * line.intensity * 40 ** i })), /hot end/],
    ['only the lowest line is there', change(table(6, 0.02, 4), (line, i) => i > 0 ? { intensity: -1e-12, sigma: 1e-9 } : {}), /./],
    ['two bands have a line each', change(table(2), (_, i) => ({ band: `${i}` })), /^2 lines do not determine/],
    ['all lines share one energy', change(table(3), line => ({ components: line.components.map(c => ({ ...c, termUpper: 10 })) })), /share one energy/],
    ['noise cannot be known', { ...table(2), noise: 'relative' }, /uncertainty of the temperature cannot be known/],
    ['a reading is incomplete', { ...table(), reading: { observable: 'brightness-integral' } }, /background temperature/],
    ['the range is upside down', { ...table(), temperatureRange: [300, 100] }, /temperature range/],
    ['the covariance has another size', { ...table(), covariance: [1, 0, 0, 1] }, /one row and one column/],
    ['the covariance is not positive definite', { ...table(2), covariance: [1, 2, 2, 1] }, /not positive definite/],
  ])('when %s', (_, input, words) => {
    const result = retrieveFromLines(input)
    if (result.temperature === null) expect(result.reason).toMatch(words)
    else expect(words.source).toBe('.')
    expect(result.lines).toHaveLength(input.lines.length)
  })

  it('names the bound that is left when chi2 falls to the hot end', () => {
    const input = syntheticInput({ temperature: 900, lines: rotorLines(4, 1.93), relative: 0.01, normal: seededNormal(2) })
    input.lines[3].intensity *= 1.1
    const result = retrieveFromLines(input)
    expect(result.reason).toMatch(/hot end of the search range, 20000 K\. Within the range it is above \d+ K/)
    expect(result.flags).toEqual(expect.arrayContaining(['edge-of-range', 'open-interval']))
  })

  it('sets a line aside that cannot be used, with a reason, and goes on with the others', () => {
    const broken = change(table(), (line, i) => i === 1 ? { intensity: Number.NaN } : i === 2 ? { sigma: 0 } : i === 3 ? { sigma: null } : {})
    const result = retrieveFromLines(broken)
    expect(result.temperature).not.toBeNull()
    expect(result.lines.map(line => line.used)).toEqual([true, false, false, false, true, true])
    expect(result.lines.slice(1, 4).map(line => line.reason)).toEqual([
      'the intensity is not a number', 'the uncertainty of the line is not a positive number', 'no uncertainty is given for the line',
    ])
    expect(result.flags).toContain('line-rejected')
  })
})

describe('flags', () => {
  it('are none for a sound table', () => {
    expect(flagsOf(table(7, 0.02))).toEqual([])
  })

  it.each<[FlagName, LineRetrievalInput]>([
    ['few-lines', table(2)],
    ['no-test', table(2)],
    ['short-lever', table(3, 0.001, 300)],
    ['weak-line', table(6, 0.1)],
    ['poor-fit', change(table(), (line, i) => i === 3 ? { intensity: 1.5 * line.intensity } : {})],
    ['edge-of-range', { ...table(), temperatureRange: [2, retrieveFromLines(table()).temperature!.value * 1.005] }],
    ['open-interval', table(3, 0.2, 60)],
    ['sigma-assumed', { ...table(), noise: 'from-residuals' }],
    ['line-rejected', change(table(), (_, i) => i === 0 ? { used: false, reason: 'blended with a sky line' } : {})],
    ['blend', { ...table(), priorFlags: ['blend'] }],
  ])('%s is raised where it belongs', (flag, input) => {
    expect(flagsOf(input)).toContain(flag)
  })

  it('call lines weak also where they are too weak for a Boltzmann plot at all', () => {
    const result = retrieveFromLines(change(table(6), line => ({ sigma: line.intensity })))
    expect(result.temperature).not.toBeNull()
    expect(result.crossChecks.find(check => check.method === 'boltzmann-plot')?.temperature).toBeNull()
    expect(result.flags).toContain('weak-line')
  })

  it('do not call a line rejected that was only measured', () => {
    expect(flagsOf(change(table(7), (_, i) => i === 0 ? { used: false } : {}))).not.toContain('line-rejected')
  })

  it('turn into bits and back, in the order of the database', () => {
    flagNames.forEach((flag, i) => expect(flagsToBits([flag])).toBe(2 ** i))
    expect(bitsToFlags(flagsToBits(['curved', 'few-lines']))).toEqual(['few-lines', 'curved'])
    expect(bitsToFlags(flagsToBits([...flagNames]))).toEqual([...flagNames])
    expect(bitsToFlags(0)).toEqual([])
    expect(flagsToBits(['blend', 'blend'])).toBe(flagsToBits(['blend']))
    expect(orderedFlags(['curved', 'few-lines', 'curved'])).toEqual(['few-lines', 'curved'])
  })

  it('all have words', () => {
    for (const flag of flagNames) expect(flagWords[flag].length).toBeGreaterThan(10)
  })
})

describe('noise', () => {
  const input = table(3, 0.05, 20)

  it('known up to a factor scales the uncertainty by sqrt(chi2/dof) and widens intervals by t quantiles (dof 1: 1.84 and 13.97)', () => {
    const fine = change(table(3, 0.001, 20), line => ({ sigma: line.sigma! }))
    const absolute = retrieveFromLines(fine)
    const relative = retrieveFromLines({ ...fine, noise: 'relative' })
    const factor = Math.sqrt(absolute.chi2!)
    expect(relative.temperature!.value).toBeCloseTo(absolute.temperature!.value, 9)
    expect(relative.temperature!.uNoise / absolute.temperature!.uNoise / factor).toBeCloseTo(1, 9)
    const { value, uNoise, interval68, interval95 } = relative.temperature!
    expect((interval68[1]! - interval68[0]!) / (2 * uNoise)).toBeCloseTo(1.84, 1)
    expect((interval95[1]! - interval95[0]!) / (2 * uNoise)).toBeCloseTo(13.97, 0)
    expect(interval68[0]).toBeLessThan(value)
    expect(relative.pValue).toBeNull()
  })

  it('from the residuals needs no sigma at all and reports the one it found', () => {
    const result = retrieveFromLines({ ...change(table(8), () => ({ sigma: null })), noise: 'from-residuals' })
    const { lines, dof } = result
    const squares = lines.reduce((sum, line) => sum + (line.intensity - line.model!) ** 2, 0)
    expect(lines[0].sigma! ** 2).toBeCloseTo(squares / dof, 20)
    expect(result.chi2).toBeNull()
  })

  it('stated as absolute without any sigma is no table', () => {
    expect(retrieveFromLines(change(input, () => ({ sigma: null }))).reason).toMatch(/^No line is used/)
  })
})
