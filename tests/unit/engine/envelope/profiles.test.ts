import { describe, expect, it } from 'vitest'
import { DiagonalProfile } from '#shared/engine/envelope/diagonal-profile'
import type { ChiSquareProfile } from '#shared/engine/envelope/problem'
import { SingleProfile } from '#shared/engine/envelope/single-profile'
import { WhitenedProfile } from '#shared/engine/envelope/whitened-profile'
import { createProfile, fitEnvelope, fitProfile } from '#shared/engine/envelope/fit-envelope'
import { neighbourCovariance, problemOf } from '../helpers/problems'
import { seededNormal } from '../helpers/random'
import { nameOf, readings, rotorLines, syntheticInput } from '../helpers/tables'

const noisy = (reading = readings[0], seed = 5) => syntheticInput({ reading, temperature: 60, lines: rotorLines(7, 1.93), relative: 0.1, normal: seededNormal(seed) })
const twoBands = (seed: number) => {
  const input = noisy(readings[0], seed)
  return { ...input, lines: [...input.lines, ...input.lines.map(line => ({ ...line, band: 'hot', intensity: 0.3 * line.intensity, sigma: 0.5 * line.sigma! }))] }
}
const apart = (a: number, b: number, size: number) => Math.abs(a - b) / size

function expectDerivatives(profile: ChiSquareProfile, beta: number) {
  const step = 1e-5 * beta
  const at = { chi2: profile.evaluate(beta), gradient: profile.gradient, curvature: profile.curvature }
  const scales = [...profile.scales]
  const slopes = [...profile.slopes]
  const above = { chi2: profile.evaluate(beta + step), gradient: profile.gradient, scales: [...profile.scales] }
  const below = { chi2: profile.evaluate(beta - step), gradient: profile.gradient, scales: [...profile.scales] }
  expect(apart((above.chi2 - below.chi2) / (2 * step), at.gradient, Math.abs(at.gradient) + at.chi2 / beta)).toBeLessThan(1e-6)
  expect(apart((above.gradient - below.gradient) / (2 * step), at.curvature, Math.abs(at.curvature) + at.chi2 / beta ** 2)).toBeLessThan(1e-5)
  return { scales, slopes, change: above.scales.map((value, b) => (value - below.scales[b]) / (2 * step)) }
}

describe.each(readings.map(reading => [nameOf(reading), reading] as const))('chi2 of %s along beta', (_, reading) => {
  it('has exact first and second derivatives, independent or correlated', () => {
    const input = noisy(reading)
    for (const T of [25, 58, 140]) {
      expectDerivatives(new DiagonalProfile(problemOf(input)), 1 / T)
      expectDerivatives(new WhitenedProfile(problemOf(input, { covariance: neighbourCovariance(input, 0.4) })), 1 / T)
    }
  })
})

it('has the same derivatives for two bands with correlated lines', () => {
  const input = twoBands(3)
  expectDerivatives(new WhitenedProfile(problemOf(input, { covariance: neighbourCovariance(input, 0.3) })), 1 / 70)
  expectDerivatives(new DiagonalProfile(problemOf(input)), 1 / 70)
})

it('gives the three kinds of profile the same numbers where all apply', () => {
  const input = noisy()
  const problem = problemOf(input)
  const diagonal = new DiagonalProfile(problem)
  const others = [new SingleProfile(problem), new WhitenedProfile(problemOf(input, { covariance: neighbourCovariance(input, 0) }))]
  for (const beta of [1 / 9, 1 / 60, 1 / 800]) {
    diagonal.evaluate(beta)
    for (const other of others) {
      other.evaluate(beta)
      expect(apart(other.chi2, diagonal.chi2, diagonal.chi2)).toBeLessThan(1e-12)
      expect(apart(other.gradient, diagonal.gradient, Math.abs(diagonal.gradient))).toBeLessThan(1e-9)
      expect(apart(other.curvature, diagonal.curvature, Math.abs(diagonal.curvature))).toBeLessThan(1e-9)
      expect(apart(other.information, diagonal.information, diagonal.information)).toBeLessThan(1e-11)
      expect(apart(other.rawInformation, diagonal.rawInformation, diagonal.rawInformation)).toBeLessThan(1e-11)
      expect(apart(other.scales[0], diagonal.scales[0], diagonal.scales[0])).toBeLessThan(1e-12)
      expect(apart(other.slopes[0], diagonal.slopes[0], Math.abs(diagonal.slopes[0]))).toBeLessThan(1e-11)
      expect(apart(other.scaleCovariance(0, 0), diagonal.scaleCovariance(0, 0), diagonal.scaleCovariance(0, 0))).toBeLessThan(1e-11)
    }
  }
  const grid = [...others, diagonal].map(profile => profile.scan(1 / 20000, 14))
  expect(new Set(grid).size).toBe(1)
  for (const other of others) expect(apart(other.scanChi2, diagonal.scanChi2, diagonal.scanChi2)).toBeLessThan(1e-10)
  for (const other of others) expect(other.start(0) / diagonal.start(0)).toBeCloseTo(1, 12)
})

it('takes the lean profile only where it is exact', () => {
  const input = noisy()
  expect(createProfile(problemOf(input))).toBeInstanceOf(SingleProfile)
  expect(createProfile(problemOf(noisy(readings[4])))).toBeInstanceOf(DiagonalProfile)
  expect(createProfile(problemOf(twoBands(1)))).toBeInstanceOf(DiagonalProfile)
  expect(createProfile(problemOf(input, { covariance: neighbourCovariance(input, 0.1) }))).toBeInstanceOf(WhitenedProfile)
})

it('refits new intensities of the same lines from one profile', () => {
  const first = problemOf(noisy(readings[0], 1))
  const profile = new SingleProfile(first)
  fitProfile(profile)
  first.intensity.set(problemOf(noisy(readings[0], 2)).intensity)
  first.inverseSigma.set(problemOf(noisy(readings[0], 2)).inverseSigma)
  profile.load()
  expect(fitProfile(profile)).toEqual(fitEnvelope(problemOf(noisy(readings[0], 2))))
})

it('keeps a scale at zero when its band is negative, and lets the other band speak alone', () => {
  const input = twoBands(4)
  const dark = { ...input, lines: input.lines.map(line => line.band === 'hot' ? { ...line, intensity: -Math.abs(line.intensity) } : line) }
  const alone = fitEnvelope(problemOf({ ...input, lines: input.lines.filter(line => line.band !== 'hot') }))
  for (const covariance of [undefined, neighbourCovariance(dark, 0)]) {
    const fit = fitEnvelope(problemOf(dark, { covariance }))
    expect(fit.scales[1]).toBe(0)
    expect(fit.beta / alone.beta).toBeCloseTo(1, 10)
    expect(fit.covariance[0] / alone.covariance[0]).toBeCloseTo(1, 9)
    expect(fit.covariance.slice(6)).toEqual([0, 0, 0])
  }
})
