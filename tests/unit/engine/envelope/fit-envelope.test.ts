import { describe, expect, it } from 'vitest'
import { createProfile, fitEnvelope, fitProfile } from '#shared/engine/envelope/fit-envelope'
import { profileInterval } from '#shared/engine/envelope/profile-interval'
import { symmetricInverseFromCholesky } from '#shared/engine/linalg/cholesky-solve'
import { cholesky } from '#shared/engine/linalg/cholesky'
import type { LineRetrievalInput } from '#shared/engine/types'
import { neighbourCovariance, problemOf } from '../helpers/problems'
import { seededNormal, seededRandom } from '../helpers/random'
import { nameOf, readings, rotorLines, syntheticInput, tableModel } from '../helpers/tables'

/** Noisy tables of signal-to-noise 4 to 100 at the strongest line. */
function noisyTable(seed: number): LineRetrievalInput {
  const random = seededRandom(seed)
  const lines = rotorLines(3 + Math.floor(10 * random()), 0.5 + 5 * random())
  const temperature = 5 * 100 ** random()
  const exact = syntheticInput({ temperature, lines })
  const strongest = Math.max(...exact.lines.map(line => line.intensity))
  return syntheticInput({ temperature, lines, sigma: strongest / (4 * 25 ** random()), normal: seededNormal(seed + 1000) })
}

it('finds the global minimum of chi2 that a fine scan finds, in 400 noisy tables', () => {
  let interior = 0
  for (let seed = 1; seed <= 400; seed++) {
    const profile = createProfile(problemOf(noisyTable(seed)))
    const fit = fitProfile(profile)
    let smallest = Infinity
    for (let beta = 1 / 20000; beta <= 1 / 2; beta *= 1.01) smallest = Math.min(smallest, profile.evaluate(beta))
    expect(fit.chi2, `table ${seed}`).toBeLessThanOrEqual(smallest * (1 + 1e-9))
    if (fit.converged) interior++
  }
  expect(interior).toBeGreaterThan(300)
})

describe.each(readings.map(reading => [nameOf(reading), reading] as const))('covariance of %s', (_, reading) => {
  it('is the inverse of the Fisher matrix built from differences of the model', () => {
    const input = syntheticInput({ reading, temperature: 60, lines: rotorLines(6, 1.93), relative: 0.05, normal: seededNormal(3) })
    const covariance = neighbourCovariance(input, 0.35)
    const fit = fitEnvelope(problemOf(input, { covariance }))
    const weight = symmetricInverseFromCholesky(cholesky(covariance, 6)!, 6)
    const reference = problemOf(input).model.referenceEnergy
    const model = (beta: number, scale: number) => input.lines.map(line =>
      scale * tableModel(reading, line.components[0], 1 / beta) * Math.exp(1.438776877503933 * reference * beta))
    const steps = [1e-5 * fit.beta, 1e-3 * fit.scales[0]]
    const columns = [0, 1].map((p) => {
      const [above, below] = [1, -1].map(sign => model(fit.beta + (p === 0 ? sign * steps[0] : 0), fit.scales[0] + (p === 1 ? sign * steps[1] : 0)))
      return above.map((value, i) => (value - below[i]) / (2 * steps[p]))
    })
    const fisher = (a: number[], b: number[]) => a.reduce((sum, x, i) => sum + x * b.reduce((inner, y, j) => inner + weight[i * 6 + j] * y, 0), 0)
    const [aa, ab, bb] = [fisher(columns[0], columns[0]), fisher(columns[0], columns[1]), fisher(columns[1], columns[1])]
    const determinant = aa * bb - ab * ab
    expect(fit.covariance[0] / (bb / determinant)).toBeCloseTo(1, 5)
    expect(fit.covariance[1] / (-ab / determinant)).toBeCloseTo(1, 5)
    expect(fit.covariance[2]).toBe(fit.covariance[1])
    expect(fit.covariance[3] / (aa / determinant)).toBeCloseTo(1, 5)
  })
})

it('ends profile intervals where chi2 has risen by k^2, on both sides', () => {
  for (let seed = 1; seed <= 60; seed++) {
    const profile = createProfile(problemOf(noisyTable(seed)))
    const fit = fitProfile(profile)
    if (!fit.converged) continue
    for (const rise of [1, 4]) {
      const [low, high] = profileInterval(profile, fit.beta, fit.chi2, rise)
      for (const [end, limit] of [[low, 2], [high, 20000]] as const) {
        const risen = profile.evaluate(1 / (end ?? limit)) - fit.chi2
        if (end === null) expect(risen).toBeLessThan(rise)
        else expect(Math.abs(risen - rise)).toBeLessThan(1e-6)
      }
      expect(low ?? 0).toBeLessThan(1 / fit.beta)
      expect(high ?? Infinity).toBeGreaterThan(1 / fit.beta)
    }
  }
})

it('tends to the symmetric interval of the Fisher uncertainty when noise is small', () => {
  const profile = createProfile(problemOf(syntheticInput({ temperature: 187, lines: rotorLines(8, 1.93), relative: 1e-5, normal: seededNormal(1) })))
  const fit = fitProfile(profile)
  const u = Math.sqrt(fit.covariance[0]) / fit.beta ** 2
  const [low, high] = profileInterval(profile, fit.beta, fit.chi2, 1)
  expect((1 / fit.beta - low!) / u).toBeCloseTo(1, 3)
  expect((high! - 1 / fit.beta) / u).toBeCloseTo(1, 3)
})

it('is asymmetric towards the hot side when the lever is short', () => {
  const profile = createProfile(problemOf(syntheticInput({ temperature: 300, lines: rotorLines(5, 1.93), relative: 0.05 })))
  const fit = fitProfile(profile)
  const [low, high] = profileInterval(profile, fit.beta, fit.chi2, 1)
  expect(high! - 300).toBeGreaterThan(1.05 * (300 - low!))
})

it('treats negative and zero intensities as data', () => {
  const input = syntheticInput({ temperature: 20, lines: rotorLines(6, 1.93), sigma: 1e-7 })
  input.lines[5].intensity = -0.5e-7
  input.lines[4].intensity = 0
  const fit = fitEnvelope(problemOf(input))
  expect(fit.converged).toBe(true)
  expect(1 / fit.beta).toBeGreaterThan(10)
  expect(1 / fit.beta).toBeLessThan(30)
})

it.each([
  ['no-positive-scale', (i: number) => -1 - i],
  ['falls-to-hot-end', (i: number) => 10 ** (3 * i)],
  ['falls-to-cold-end', (i: number) => i === 0 ? 1 : 0],
] as const)('says %s where there is no minimum', (reason, intensity) => {
  const input = syntheticInput({ temperature: 60, lines: rotorLines(4, 20) })
  input.lines.forEach((line, i) => Object.assign(line, { intensity: intensity(i), sigma: 1 }))
  const fit = fitEnvelope(problemOf(input))
  expect(fit.reason).toBe(reason)
  expect(fit.converged).toBe(false)
})

it('sees that lines of one energy know no temperature', () => {
  const lines = [1, 2, 3].map(A => ({ ...rotorLines(1, 2)[0], label: `${A}`, components: [{ ...rotorLines(1, 2)[0].components[0], einsteinA: A }] }))
  expect(fitEnvelope(problemOf(syntheticInput({ temperature: 60, lines }))).reason).toBe('no-information')
})
