import { describe, expect, it } from 'vitest'
import { flagNames, type RetrievalResult, type ResultLine } from '#shared/engine/types'
import { budgetRows, sharedSentence } from '~/utils/result/budget'
import { crossCheckWords } from '~/utils/result/cross-check-words'
import { lineRows } from '~/utils/result/line-rows'
import { intervalWords, quantityWords, signed, temperatureParts } from '~/utils/result/number-words'
import { resultChips } from '~/utils/result/result-chips'
import { revisionRows } from '~/utils/result/revision-rows'
import { strengthSetRows } from '~/utils/result/strength-set-rows'

const temperature: RetrievalResult['temperature'] = { value: 187.43, uNoise: 1.27, uSystematic: 2.1, interval68: [186.14, 188.81], interval95: [184.9, null], unit: 'K' }
const line: ResultLine = {
  label: 'P1(2)', band: '3-1', termEnergy: 0, wavenumber: 6561, strength: 1, intensity: 812.4, sigma: 8, model: 809, residual: -0.62,
  leverage: 0.5, temperatureWithout: 190.26, logRatio: 6.7, sigmaLogRatio: 0.01, used: true,
}

describe('numbers in words', () => {
  it('prints value, noise and systematic part with the same decimals', () => {
    expect(temperatureParts(temperature!)).toEqual({ value: '187.4', noise: '1.3', systematic: '2.1' })
  })
  it('says an open side of an interval', () => {
    expect(intervalWords([186.14, 188.81], 1.27)).toBe('186.1 – 188.8 K')
    expect(intervalWords([null, 188.81], 1.27)).toBe('below 188.8 K, open towards lower temperatures')
    expect(intervalWords([186.14, null], 1.27)).toBe('above 186.1 K, open towards higher temperatures')
    expect(intervalWords([null, null])).toBe('open on both sides')
  })
  it('gives a change its sign, and none to nothing', () => {
    expect([signed(2.31, 1), signed(-0.62, 1), signed(-0.01, 1)]).toEqual(['+2.3', '−0.6', '0.0'])
  })
  it('gives a quantity the decimals of its uncertainty, and a power of ten where it is tiny', () => {
    expect(quantityWords(812.44, 8)).toBe('812.4')
    expect(quantityWords(1.234e-17, 1e-19)).toBe('1.234e−17')
  })
})

describe('parts of a result', () => {
  it('puts noise first and systematics by size, with bars in proportion', () => {
    const rows = budgetRows({ temperature, components: [{ name: 'continuum', kelvin: 0.7, commonTo: 'line' }, { name: 'strength set', kelvin: 2.54, commonTo: 'all' }] })
    expect(rows.map(row => row.name)).toEqual(['noise', 'strength set', 'continuum'])
    expect(rows[0]!.share).toBeCloseTo(0.5, 9)
  })
  it('names what an average does not make smaller', () => {
    expect(sharedSentence([{ name: 'strength set', kelvin: 1, commonTo: 'all' }, { name: 'response', kelvin: 1, commonTo: 'instrument' }])).toBe('strength set and response are shared by many results: an average does not make them smaller.')
    expect(sharedSentence([{ name: 'line selection', kelvin: 1, commonTo: 'line' }])).toBeNull()
  })
  it('shows the other strength sets with their change', () => {
    const rows = strengthSetRows({ temperature, strengthSet: 'brooke2016', strengthSets: [{ name: 'brooke2016', temperature: 187.43, uNoise: 1 }, { name: 'mies1974', temperature: 190.3, uNoise: 1 }, { name: 'hitran', temperature: null, uNoise: null }] })
    expect(rows.map(row => [row.name, row.temperature, row.change])).toEqual([['brooke2016', '187.4', ''], ['mies1974', '190.3', '+2.9'], ['hitran', 'no value', '']])
  })
  it('says every raised flag in words and never as a code', () => {
    const chips = resultChips({ lines: [line], leverArm: 2.4, pValue: 0.41, curvatureZ: null, flags: [...flagNames] })
    expect(chips[0]!.words).toBe('1 line, lever arm 2.4')
    expect(chips.filter(chip => chip.warns)).toHaveLength(flagNames.length)
    for (const flag of flagNames) expect(chips.map(chip => chip.words)).not.toContain(flag)
  })
  it('prints a line, and a dash for what is not known', () => {
    expect(lineRows([line], 1.27)[0]).toMatchObject({ intensity: '812.4', sigma: '8.0', residual: '−0.6', without: '190.3' })
    expect(lineRows([{ ...line, sigma: null, residual: null, temperatureWithout: null }], 1.27)[0]).toMatchObject({ sigma: '–', residual: '–', without: '–' })
    expect(lineRows([{ ...line, intensity: 7.887e7, sigma: 5.7e5 }], 1.27, 7)[0]).toMatchObject({ intensity: '7.887', sigma: '0.057' })
  })
  it('gives a cross-check that has only an interval as an interval', () => {
    expect(crossCheckWords({ method: 'strongest-line', temperature: null, uncertainty: null, interval: [169.2, 397.5], note: '' }).value).toBe('169.2 – 397.5 K')
    expect(crossCheckWords({ method: 'two-line-ratio', temperature: null, uncertainty: null, interval: null, note: '' }).value).toBe('no value')
  })
  it('lists revisions newest first with their reviews', () => {
    const base = { phase: 'COMPLETED' as const, createdAt: '2026-01-14T21:40:00.000Z', createdBy: 'Ida', note: '', temperature: 187.43, uNoise: 1.27 }
    const rows = revisionRows({ revisions: [{ ...base, revision: 1 }, { ...base, revision: 2, note: 'without P1(5)' }], reviews: [{ revision: 2, verdict: 'return', note: 'which lines?', reviewer: 'Per', createdAt: '2026-01-15T00:00:00.000Z' }] })
    expect(rows.map(row => row.revision)).toEqual([2, 1])
    expect(rows[0]!.remarks).toEqual(['without P1(5)', 'Returned by Per: which lines?'])
    expect(rows[1]!.temperature).toBe('187.4 ± 1.3')
  })
})
