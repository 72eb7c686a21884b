import fc from 'fast-check'
import { expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import type { LineRetrievalInput } from '#shared/engine/types'
import { seededNormal } from '../helpers/random'
import { readings, rotorLines, syntheticInput } from '../helpers/tables'

/** A noisy but well-bounded table of any observable. */
const tables = fc.record({
  reading: fc.constantFrom(...readings),
  seed: fc.integer({ min: 1, max: 1e6 }),
  count: fc.integer({ min: 4, max: 9 }),
  temperature: fc.double({ min: 15, max: 120, noNaN: true }),
}).map(({ reading, seed, count, temperature }) => syntheticInput({ reading, temperature, lines: rotorLines(count, 1.93), relative: 0.05, normal: seededNormal(seed) }))

const scaled = (input: LineRetrievalInput, factor: number): LineRetrievalInput =>
  ({ ...input, lines: input.lines.map(line => ({ ...line, intensity: factor * line.intensity, sigma: factor * line.sigma! })) })

function expectSameTemperature(a: LineRetrievalInput, b: LineRetrievalInput, tolerance: number) {
  const [first, second] = [retrieveFromLines(a), retrieveFromLines(b)]
  expect(second.reason).toBe(first.reason)
  if (!first.temperature || !second.temperature) return
  expect(Math.abs(second.temperature.value / first.temperature.value - 1)).toBeLessThan(tolerance)
  expect(Math.abs(second.temperature.uNoise / first.temperature.uNoise - 1)).toBeLessThan(1e3 * tolerance)
  expect(Math.abs(second.chi2! / first.chi2! - 1)).toBeLessThan(1e3 * tolerance)
  expect(second.flags).toEqual(first.flags)
}

it('does not depend on the order of the lines', () => {
  fc.assert(fc.property(tables, fc.integer({ min: 1, max: 8 }), (input, turn) => {
    const lines = [...input.lines.slice(turn % input.lines.length), ...input.lines.slice(0, turn % input.lines.length)].reverse()
    expectSameTemperature(input, { ...input, lines }, 1e-10)
  }), { seed: 11, numRuns: 150 })
})

it.each([1e9, 1e-9])('does not depend on the unit of the intensities: times %d', (factor) => {
  fc.assert(fc.property(tables, (input) => {
    expectSameTemperature(input, scaled(input, factor), 1e-10)
  }), { seed: 12, numRuns: 100 })
})

it('scales the scale with the intensities', () => {
  fc.assert(fc.property(tables, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (input, factor) => {
    const [a, b] = [retrieveFromLines(input), retrieveFromLines(scaled(input, factor))]
    if (!a.temperature) return
    expect(b.scales[0].value / a.scales[0].value / factor).toBeCloseTo(1, 8)
    expect(b.scales[0].uNoise! / a.scales[0].uNoise! / factor).toBeCloseTo(1, 6)
  }), { seed: 13, numRuns: 60 })
})

it('does not depend on the zero of energy, nor does its scale', () => {
  fc.assert(fc.property(tables, fc.double({ min: -5000, max: 30000, noNaN: true }), (input, shift) => {
    const lines = input.lines.map(line => ({ ...line, components: line.components.map(c => ({ ...c, termUpper: c.termUpper + shift, termLower: c.termLower + shift })) }))
    expectSameTemperature(input, { ...input, lines }, 1e-8)
    const [a, b] = [retrieveFromLines(input), retrieveFromLines({ ...input, lines })]
    if (a.temperature) expect(b.scales[0].value / a.scales[0].value).toBeCloseTo(1, 7)
  }), { seed: 14, numRuns: 100 })
})

it('does not depend on a factor common to all strengths', () => {
  fc.assert(fc.property(tables, fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (input, factor) => {
    const lines = input.lines.map(line => ({ ...line, components: line.components.map(c => ({ ...c, einsteinA: factor * c.einsteinA })) }))
    expectSameTemperature(input, { ...input, lines }, 1e-10)
  }), { seed: 15, numRuns: 100 })
})

it('gives the diagonal and the same diagonal as a full covariance the same answer', () => {
  fc.assert(fc.property(tables, (input) => {
    const n = input.lines.length
    const covariance = Array.from({ length: n * n }, (_, at) => at % (n + 1) === 0 ? input.lines[at / (n + 1)].sigma! ** 2 : 0)
    expectSameTemperature(input, { ...input, covariance }, 1e-10)
  }), { seed: 16, numRuns: 100 })
})

it('leaves a line that is not used without any influence', () => {
  fc.assert(fc.property(tables, fc.double({ min: -1e3, max: 1e3, noNaN: true }), (input, intensity) => {
    const extra = { ...input.lines[0], label: 'extra', intensity, used: false }
    expectSameTemperature(input, { ...input, lines: [extra, ...input.lines] }, 1e-12)
  }), { seed: 17, numRuns: 60 })
})

it('gives relative noise the same temperature whatever the common factor of its sigmas', () => {
  fc.assert(fc.property(tables, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (input, factor) => {
    const [a, b] = [1, factor].map(f => retrieveFromLines({ ...input, noise: 'relative', lines: input.lines.map(line => ({ ...line, sigma: f * line.sigma! })) }))
    expect(b.reason?.slice(0, 30)).toBe(a.reason?.slice(0, 30))
    if (!a.temperature) return
    expect(b.temperature!.value / a.temperature.value).toBeCloseTo(1, 9)
    expect(b.temperature!.uNoise / a.temperature.uNoise).toBeCloseTo(1, 6)
    for (const side of [0, 1]) {
      const [x, y] = [a, b].map(result => result.temperature!.interval95[side])
      if (x === null) expect(y).toBeNull()
      else expect(y! / x).toBeCloseTo(1, 6)
    }
  }), { seed: 18, numRuns: 100 })
})
