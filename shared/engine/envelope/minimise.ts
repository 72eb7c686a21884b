import { newtonToMinimum } from './newton'
import type { NewtonEnd } from './newton'
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

/** Refinements of the straight-line start for observables whose phi is not a pure exponential. */
const startRounds = 3

/**
 * Global minimum of chi2(beta): a scan that doubles beta and the straight-line estimate give a start and a bracket
 * that holds a root of the gradient; safeguarded Newton finishes. On return the profile stands at the minimum.
 */
export function minimiseProfile(profile: ChiSquareProfile): Minimum {
  const [low, high] = profile.problem.betaRange
  const count = Math.floor(Math.log2(high / low)) + 1
  const k = profile.scan(low, count)
  const gridBeta = low * 2 ** k
  const gridChi2 = profile.scanChi2
  const started = lineStart(profile, gridBeta)
  if (started > low && started < high && profile.evaluate(started) < gridChi2) {
    const below = low * 2 ** Math.floor(Math.log2(started / low))
    const end = newtonToMinimum(profile, started, below, Math.min(high, 2 * below))
    return ended(profile, end, count + 1)
  }
  const edge = edgeOf(profile, k, count, gridChi2)
  if (edge !== 'none') return { beta: edge === 'low-beta' ? low : high, converged: false, edge, iterations: 0, evaluations: count + 2 }
  profile.evaluate(gridBeta)
  return ended(profile, newtonToMinimum(profile, gridBeta, Math.max(low, gridBeta / 2), Math.min(high, 2 * gridBeta)), count + 3)
}

function ended(profile: ChiSquareProfile, end: NewtonEnd, evaluationsBefore: number): Minimum {
  const evaluations = evaluationsBefore + end.iterations
  // Only a minimum wider than beta itself can reach an end of the range.
  const edge = profile.information * end.beta ** 2 < 1 ? flatEnd(profile, end.beta) : 'none'
  return { beta: end.beta, converged: end.converged, edge, iterations: end.iterations, evaluations }
}

/** Share of the data's sum of squares below which two values of chi2 differ by rounding only. */
const rounding = 1e-14

/** The end of the range up to which chi2 stays at its minimum to rounding: exponentials that have died out bound nothing. */
function flatEnd(profile: ChiSquareProfile, beta: number): Minimum['edge'] {
  const [low, high] = profile.problem.betaRange
  const least = profile.chi2 + rounding * profile.dataSquares
  const edge = profile.evaluate(high) <= least ? 'high-beta' : profile.evaluate(low) <= least ? 'low-beta' : 'none'
  profile.evaluate(beta)
  return edge
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
  if (profile.problem.model.kind === 'plain') return profile.start(0)
  let beta = gridBeta
  for (let round = 0; round < startRounds; round++) {
    const next = profile.start(beta)
    if (!(next > 0)) return beta
    beta = next
  }
  return beta
}
