import { createProfile, fitProfile } from '../envelope/fit-envelope'
import type { EnvelopeProblem } from '../envelope/problem'
import { correlatedNormal, normalNumbers } from '../random/normal'
import { seededGenerator } from '../random/seed'
import { pairDescentFor, searchPair } from './fit-pair'
import type { PairGrid } from './pair-grid'
import type { PairModel } from './pair-model'

/** Data as they would be with one temperature, and how they are judged. */
export interface NullHypothesis {
  /** Intensities of the one-temperature fit, length n. */
  expected: Float64Array
  /** Factor from the stated covariance to the real one. */
  varianceFactor: number
  /** `difference`: chi2_1 - chi2_2, for known noise. `ratio`: (chi2_1 - chi2_2) / chi2_2, which does not depend on the noise's unknown factor. */
  statistic: 'difference' | 'ratio'
}

/** By what a second temperature improves a fit; never negative. */
export function improvement(chi2One: number, chi2Two: number, statistic: NullHypothesis['statistic']): number {
  const difference = Math.max(0, chi2One - chi2Two)
  return statistic === 'difference' ? difference : difference > 0 ? difference / chi2Two : 0
}

/**
 * p value of an improvement by parametric bootstrap (Efron & Tibshirani 1993, 6.5 and 16): how often data of one temperature and
 * the same noise improve as much. (The F distribution fails here: without a second gas its scale lies on its bound and its
 * temperature means nothing; Protassov et al. 2002, ApJ 571, 545.)
 * Draw i uses stream i + 1 of the seed. Yields the number of draws done, at least once a draw.
 *
 * @returns (1 + number of draws that improve at least as much) / (1 + draws): Davison & Hinkley 1997, 4.11
 */
export function* bootstrapProbability(model: PairModel, grid: PairGrid, observed: number, hypothesis: NullHypothesis, draws: number, seed: number): Generator<number, number> {
  const descent = pairDescentFor(model.problem)
  let asGood = 0
  for (let draw = 0; draw < draws; draw++) {
    const intensity = simulate(model.problem, hypothesis, seed, draw)
    const one = fitProfile(createProfile({ ...model.problem, intensity })).chi2
    const search = searchPair(grid, descent, model.whiten(Float64Array.from(intensity)))
    let step = search.next()
    for (; !step.done; step = search.next()) yield draw
    if (improvement(one, step.value?.chi2 ?? one, hypothesis.statistic) >= observed) asGood++
    yield draw + 1
  }
  return (1 + asGood) / (1 + draws)
}

function simulate({ factor, inverseSigma }: EnvelopeProblem, { expected, varianceFactor }: NullHypothesis, seed: number, draw: number): Float64Array {
  const normal = normalNumbers(seededGenerator(seed, draw + 1))
  const size = Math.sqrt(varianceFactor)
  const noise = factor ? correlatedNormal(factor, expected.length, normal) : Float64Array.from(inverseSigma, q => normal() / q)
  return noise.map((value, i) => expected[i] + size * value)
}
