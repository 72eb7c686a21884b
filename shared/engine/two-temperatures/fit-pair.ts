import type { EnvelopeProblem } from '../envelope/problem'
import { minimiseSquares } from '../optimise/minimise-squares'
import type { LeastSquaresResult } from '../optimise/types'
import { CoupledBands } from './coupled-bands'
import type { PairDescent } from './pair-descent'
import type { PairGrid } from './pair-grid'
import type { PairModel } from './pair-model'
import { SeparateBands } from './separate-bands'

/** Grid minima that are followed to their ends: with fewer, noise around one temperature is often fitted worse than it could be. */
const followed = 6

/** Bounds of `PairModel`'s parameters: the search range of beta, scales not negative. */
export function pairBounds({ problem: { betaRange: [low, high] }, bandCount }: PairModel): { lower: number[], upper: number[] } {
  const scales = 2 * bandCount
  return { lower: [low, low, ...new Array<number>(scales).fill(0)], upper: [high, high, ...new Array<number>(scales).fill(Infinity)] }
}

/** The descent that suits a problem. */
export function pairDescentFor(problem: EnvelopeProblem): PairDescent {
  return problem.factor && problem.bandCount > 1 ? new CoupledBands(problem) : new SeparateBands(problem)
}

/**
 * chi2 of the best pair of temperatures and its parameters: the grid's minima, each followed to its end. Yields between them.
 *
 * @param whitened data in units of their noise, length n
 * @returns null when the grid has no minimum off its diagonal
 */
export function* searchPair(grid: PairGrid, descent: PairDescent, whitened: Float64Array): Generator<void, { chi2: number, parameters: Float64Array } | null> {
  let best: { chi2: number, parameters: Float64Array } | null = null
  for (const { parameters } of grid.starts(whitened, followed)) {
    const chi2 = descent.descend(whitened, [parameters[0], parameters[1]])
    if (best === null || chi2 < best.chi2) best = { chi2, parameters: descent.parameters() }
    yield
  }
  return best
}

/**
 * The two temperatures of smallest chi2 with the covariance of all parameters: the search, ended by least squares with bounds.
 * Parameters as of `PairModel`, T_cold < T_hot; unscaled covariance.
 */
export function* fitPair(model: PairModel, grid: PairGrid): Generator<void, LeastSquaresResult | null> {
  const { intensity } = model.problem
  const found = yield* searchPair(grid, pairDescentFor(model.problem), model.whiten(Float64Array.from(intensity)))
  return found && minimiseSquares(model.leastSquares(intensity), found.parameters, { ...pairBounds(model), noise: 'absolute' })
}
