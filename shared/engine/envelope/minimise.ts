import { logStart } from './log-start'
import { newtonToMinimum } from './newton'
import type { ChiSquareProfile } from './problem'

/** Where the search for the smallest chi2 ended. */
export interface Minimum {
  beta: number
  converged: boolean
  /** The end of the range towards which chi2 keeps falling. */
  edge: 'none' | 'low-beta' | 'high-beta'
  iterations: number
  evaluations: number
}

/** Ratio of neighbouring points of the scan. */
export const gridRatio = Math.SQRT2
/** Refinements of the straight-line start for observables whose phi is not a pure exponential. */
const startRounds = 3

/**
 * Global minimum of chi2(beta): a scan on a grid of ratio sqrt(2) and the straight-line estimate give a start and a bracket
 * that holds a root of the gradient; safeguarded Newton finishes. On return the profile stands at the minimum.
 */
export function minimiseProfile(profile: ChiSquareProfile): Minimum {
  const [low, high] = profile.problem.betaRange
  const count = Math.floor(Math.log(high / low) / Math.log(gridRatio)) + 1
  const k = profile.scan(low, gridRatio, count)
  const gridBeta = low * gridRatio ** k
  const gridChi2 = profile.evaluate(gridBeta)
  const started = lineStart(profile, gridBeta)
  let evaluations = count + 2
  if (started > low && started < high && profile.evaluate(started) < gridChi2) {
    const below = low * gridRatio ** Math.floor(Math.log(started / low) / Math.log(gridRatio))
    const end = newtonToMinimum(profile, started, below, Math.min(high, below * gridRatio))
    return { ...end, edge: 'none', evaluations: evaluations + end.iterations }
  }
  const edge = edgeOf(profile, k, count, gridChi2)
  evaluations += 2
  if (edge !== 'none') return { beta: edge === 'low-beta' ? low : high, converged: false, edge, iterations: 0, evaluations }
  profile.evaluate(gridBeta)
  const end = newtonToMinimum(profile, gridBeta, Math.max(low, gridBeta / gridRatio), Math.min(high, gridBeta * gridRatio))
  return { ...end, edge: 'none', evaluations: evaluations + end.iterations }
}

/** Does chi2 keep falling out of the range at the end next to grid point k? The profile then stands at that end. */
function edgeOf(profile: ChiSquareProfile, k: number, count: number, gridChi2: number): Minimum['edge'] {
  const [low, high] = profile.problem.betaRange
  if (k === 0) {
    profile.evaluate(low)
    if (profile.gradient >= 0) return 'low-beta'
  }
  if (k === count - 1 && profile.evaluate(high) <= gridChi2 && profile.gradient <= 0) return 'high-beta'
  return 'none'
}

function lineStart(profile: ChiSquareProfile, gridBeta: number): number {
  const { problem } = profile
  if (problem.model.kind === 'plain') return logStart(problem, 0)
  let beta = gridBeta
  for (let round = 0; round < startRounds; round++) {
    const next = logStart(problem, beta)
    if (!(next > 0)) return beta
    beta = next
  }
  return beta
}
