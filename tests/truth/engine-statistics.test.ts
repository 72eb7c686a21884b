import { describe, expect, it } from 'vitest'
import { chiSquareCdf, chiSquareQuantile, chiSquareTail } from '#shared/engine/statistics/chi-square'
import { erf, erfc } from '#shared/engine/statistics/erf'
import { fisherCdf, fisherQuantile, fisherTail } from '#shared/engine/statistics/fisher-f'
import { incompleteBeta } from '#shared/engine/statistics/incomplete-beta'
import { lowerGamma, upperGamma } from '#shared/engine/statistics/incomplete-gamma'
import { logGamma } from '#shared/engine/statistics/log-gamma'
import { normalCdf, normalCoverage, normalQuantile } from '#shared/engine/statistics/normal'
import { studentCdf, studentCoverageFactor, studentQuantile, studentTail } from '#shared/engine/statistics/student-t'
import { runPython } from './python/run-python'

const shapes = [0.5, 1, 1.5, 2.5, 7, 20.5, 150, 1000]
const ratios = [0.05, 0.3, 0.8, 1, 1.2, 2, 5]
const degrees = [1, 2, 3, 7, 12, 60, 400]
const probabilities = [1e-6, 0.001, 0.05, 0.3, 0.5, 0.6827, 0.9545, 0.999]
const places = [-6, -2.3, -0.7, -0.01, 0, 0.01, 0.4, 1, 2.3, 5]

const pairs = <A, B>(a: A[], b: B[]) => a.flatMap(x => b.map(y => [x, y] as [A, B]))
const degreePairs = pairs(degrees, degrees)

/** Function, argument lists. Truth: scipy.special and scipy.stats, called in this test. */
const cases: Record<string, [(...x: number[]) => number, number[][]]> = {
  logGamma: [logGamma, [0.1, 0.5, 1.5, 3, 7.7, 9.99, 10, 33, 1000, 1e6].map(x => [x])],
  erf: [erf, places.map(x => [x])],
  erfc: [erfc, [...places, 10, 20].map(x => [x])],
  lowerGamma: [lowerGamma, pairs(shapes, ratios).map(([a, r]) => [a, a * r])],
  upperGamma: [upperGamma, pairs(shapes, ratios).map(([a, r]) => [a, a * r])],
  incompleteBeta: [incompleteBeta, pairs(pairs(shapes, shapes), [0.01, 0.2, 0.5, 0.77, 0.99]).map(([[a, b], x]) => [a, b, x])],
  normalCdf: [normalCdf, places.map(x => [x])],
  normalQuantile: [normalQuantile, [1e-12, ...probabilities].map(p => [p])],
  chiSquareCdf: [chiSquareCdf, pairs(degrees, ratios).map(([n, r]) => [n * r, n])],
  chiSquareTail: [chiSquareTail, pairs(degrees, ratios).map(([n, r]) => [n * r, n])],
  chiSquareQuantile: [chiSquareQuantile, pairs(probabilities, degrees)],
  fisherCdf: [fisherCdf, pairs(degreePairs, ratios).map(([[m, n], x]) => [x, m, n])],
  fisherTail: [fisherTail, pairs(degreePairs, ratios).map(([[m, n], x]) => [x, m, n])],
  fisherQuantile: [fisherQuantile, pairs(probabilities.slice(1), degreePairs).map(([p, [m, n]]) => [p, m, n])],
  studentCdf: [studentCdf, pairs(places, degrees)],
  studentTail: [studentTail, pairs(places, degrees)],
}

/** Relative; below 1e-280 both are noise of the exponential. scipy itself is 1.2e-12 off I_0.99(1000, 7), see the exact values below. */
const tolerance = (name: string) => name === 'incompleteBeta' ? 2e-12 : 1e-12

describe('statistics against scipy', () => {
  const calls = Object.entries(cases).flatMap(([name, [, lists]]) => lists.map(list => [name, list] as const))
  const truth = runPython<number[]>('special_functions.py', calls)

  it.each(Object.keys(cases))('%s agrees to 1e-12', (name) => {
    let checked = 0
    const worst = calls.reduce((most, [of, list], i) => {
      if (of !== name || Math.abs(truth[i]) < 1e-280) return most
      checked++
      const error = Math.abs(cases[name][0](...list) - truth[i]) / Math.max(Math.abs(truth[i]), name === 'logGamma' ? 1 : 0)
      return error > most.error ? { error, list, truth: truth[i] } : most
    }, { error: 0, list: [] as number[], truth: 0 })
    expect(checked).toBeGreaterThan(5)
    expect(worst.error, JSON.stringify(worst)).toBeLessThan(tolerance(name))
  })
})

it('has t quantiles at which the distribution function of scipy gives the probability back to 1e-12 (its own quantiles hold only 1e-9)', () => {
  const asked = pairs(probabilities, degrees)
  const back = runPython<number[]>('special_functions.py', asked.map(([p, dof]) => ['studentCdf', [studentQuantile(p, dof), dof]]))
  asked.forEach(([p], i) => expect(Math.abs(back[i] / p - 1)).toBeLessThan(1e-12))
})

it('keeps 1e-14 where scipy does not (truth: exact rational sums, Python fractions and 40-digit decimals)', () => {
  // I_0.99(1000, 7) as a binomial sum; scipy 1.10 gives 0.12515019623350948.
  expect(Math.abs(incompleteBeta(1000, 7, 0.99) / 0.12515019623335622 - 1)).toBeLessThan(1e-14)
  // F quantile at 1e-6 with (1, 400): the series of I_x(1/2, 200); scipy 1.10 is 6e-11 away.
  expect(Math.abs(fisherQuantile(1e-6, 1, 400) / 1.5727610478524792e-12 - 1)).toBeLessThan(1e-14)
  // t of 3 degrees of freedom has the tail (atan(1/u) - u/(1+u^2))/pi, u = t/sqrt(3); scipy's quantile at 1e-6 is 2e-9 away.
  const u = -studentQuantile(1e-6, 3) / Math.sqrt(3)
  const w = 1 / u
  const tail = (2 / 3 * w ** 3 - 4 / 5 * w ** 5 + 6 / 7 * w ** 7 - 8 / 9 * w ** 9) / Math.PI
  expect(Math.abs(tail / 1e-6 - 1)).toBeLessThan(1e-13)
})

it('finds the middle of the t distribution at zero', () => {
  for (const dof of degrees) expect(Math.abs(studentQuantile(0.5, dof))).toBeLessThan(1e-15)
})

it('has the coverage factors of one degree of freedom (truth: Cauchy distribution, k = tan(pi p / 2))', () => {
  for (const p of [normalCoverage(1), normalCoverage(2)]) expect(studentCoverageFactor(p, 1)).toBeCloseTo(Math.tan(Math.PI * p / 2), 10)
  expect(studentCoverageFactor(normalCoverage(1), 1).toFixed(2)).toBe('1.84')
  expect(studentCoverageFactor(normalCoverage(2), 1).toFixed(2)).toBe('13.97')
})

it('turns every quantile back into its probability', () => {
  for (const p of probabilities) {
    expect(normalCdf(normalQuantile(p))).toBeCloseTo(p, 13)
    for (const dof of degrees) {
      expect(chiSquareCdf(chiSquareQuantile(p, dof), dof)).toBeCloseTo(p, 13)
      expect(studentCdf(studentQuantile(p, dof), dof)).toBeCloseTo(p, 13)
    }
  }
})

it('ends at the ends', () => {
  expect([normalQuantile(0), normalQuantile(1)]).toEqual([-Infinity, Infinity])
  expect([chiSquareQuantile(0, 3), chiSquareQuantile(1, 3)]).toEqual([0, Infinity])
  expect([lowerGamma(2, 0), lowerGamma(2, Infinity), upperGamma(2, 0), upperGamma(2, Infinity)]).toEqual([0, 1, 1, 0])
  expect([incompleteBeta(2, 3, 0), incompleteBeta(2, 3, 1)]).toEqual([0, 1])
})

it('ends quantiles at the range of doubles (truth: leading terms of the tails, chi2 1: x = pi p^2 / 2; t 1: -cot pi p)', () => {
  expect(chiSquareQuantile(1e-300, 1)).toBe(0)
  expect(chiSquareQuantile(1e-140, 1) / (Math.PI / 2 * 1e-280)).toBeCloseTo(1, 12)
  expect(fisherQuantile(1, 3, 1, 1e-300)).toBe(Infinity)
  expect(studentQuantile(1e-300, 1) / (-1e300 / Math.PI)).toBeCloseTo(1, 12)
  expect(studentTail(1e200, 1) / (1e-200 / Math.PI)).toBeCloseTo(1, 12)
  expect(studentQuantile(0.5, 4)).toBe(0)
})

it('takes the complement of a probability for its digits', () => {
  expect(chiSquareTail(chiSquareQuantile(1, 5, 1e-250), 5) / 1e-250).toBeCloseTo(1, 10)
  expect(studentTail(studentQuantile(1, 7, 1e-250), 7) / 1e-250).toBeCloseTo(1, 10)
  expect(fisherTail(fisherQuantile(1, 4, 9, 1e-250), 4, 9) / 1e-250).toBeCloseTo(1, 10)
})
