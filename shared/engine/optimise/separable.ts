import type { LeastSquaresResult } from './types'

/** A model that is linear in p of its parameters: y ~ sum over k of c_k column_k(alpha), alpha the q others. */
export interface SeparableProblem {
  /** The m data, divided by their standard uncertainties where those are known. */
  data: ArrayLike<number>
  /** p, at least 1. */
  linearCount: number
  /** Writes the columns at `alpha`, row-major m x p, divided by the same uncertainties, into `out`. */
  columns: (alpha: Float64Array, out: Float64Array) => void
  /** Writes d column_k(i) / d alpha_j to out[(i p + k) q + j]. Absent: differences of `columns`. */
  derivatives?: (alpha: Float64Array, out: Float64Array) => void
}

/** As of `minimiseSquares`, with `value` and `covariance` for all parameters: the q of alpha, then the p linear ones. */
export interface SeparableResult extends LeastSquaresResult {
  /** alpha, length q. */
  nonlinear: Float64Array
  /** c, length p. */
  linear: Float64Array
}
