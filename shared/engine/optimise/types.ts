/**
 * What the least-squares solvers take and give. Shapes: m residuals, n parameters; matrices row-major.
 * Parameters carry whatever units the caller gives them; every test inside is free of those units.
 */

/** A problem: find the n parameters p that make sum over i of r_i(p)^2 smallest. */
export interface LeastSquaresProblem {
  /** m, at least n. */
  residualCount: number
  /**
   * Writes the m residuals at `parameters` into `out`, already divided by their standard uncertainties where those are known.
   * A point where the model cannot be evaluated is told by a number that is not finite; it is never accepted.
   */
  residuals: (parameters: Float64Array, out: Float64Array) => void
  /** Writes d r_i / d p_j, row-major m x n, into `out`. Absent: differences, see `differences.ts`. */
  jacobian?: (parameters: Float64Array, out: Float64Array) => void
}

/** Options; each default stands in `defaults.ts`. */
export interface LeastSquaresOptions {
  /** Lowest value of each parameter, length n; -Infinity where there is none. @defaultValue none */
  lower?: ArrayLike<number>
  /** Highest value of each parameter, length n; Infinity where there is none. @defaultValue none */
  upper?: ArrayLike<number>
  /** `absolute`: residuals are in units of their standard uncertainty; `relative`: the covariance is scaled by sum of squares / dof. @defaultValue 'relative' */
  noise?: 'absolute' | 'relative'
  /** Steps tried at most, accepted or not. @defaultValue 1000 */
  maxIterations?: number
  /** Converged: the part of the residuals that the parameters could still remove is at most this part of their length. @defaultValue 1e-12 */
  offsetTolerance?: number
  /** Converged: an accepted step moved every parameter by at most this part of itself. @defaultValue 1e-12 */
  stepTolerance?: number
  /** Converged: an accepted step lowered the sum of squares by at most this part of it, and should have. @defaultValue 1e-15 */
  reductionTolerance?: number
  /** Damping of the first step. @defaultValue 1e-2 */
  damping?: number
  /**
   * Size of each parameter that counts: steps are damped, and differences taken, in parts of |p| or of this, whichever is larger.
   * Length n, not negative; give it for parameters that start at zero. @defaultValue 1e-4 of |start|
   */
  scale?: ArrayLike<number>
  /** Undamped Gauss-Newton steps at most after convergence; 0 for none. @defaultValue 20 */
  polishSteps?: number
  /** Asked before every step; true ends the fit with the best point so far. @defaultValue never */
  stop?: () => boolean
}

/** How a fit ended. */
export type EndReason
  /** The residuals are orthogonal to what the parameters can change. */
  = | 'offset'
  /** The last steps were negligible. */
    | 'step'
  /** The last step could not lower the sum of squares any more. */
    | 'reduction'
  /** No step lowers the sum of squares beyond its rounding, and the offset is negligible. */
    | 'rounding'
  /** The sum of squares is zero. */
    | 'exact'
  /** No step lowers the sum of squares, yet the offset is not negligible: derivatives that do not belong to the residuals, or a cliff. */
    | 'stalled'
  /** The residuals do not depend on some combination of the parameters there: no single answer. */
    | 'undetermined'
    | 'iteration-limit'
    | 'stopped'
  /** The start, the bounds or the options are not what they must be; `message` says which. */
    | 'invalid-input'
  /** Residuals or derivatives are not finite at the start, or derivatives at an accepted point. */
    | 'not-finite'

/** What a solver gives back, always; it throws for nothing. */
export interface LeastSquaresResult {
  /** The best parameters found, length n. */
  value: Float64Array
  /** Their covariance, n x n; rows of parameters at a bound are zero. Null when it cannot be known. */
  covariance: Float64Array | null
  /** Sum of squared residuals. */
  sumOfSquares: number
  /** Residuals at `value`, length m. */
  residuals: Float64Array
  /** m minus the number of parameters that are free at the end. */
  dof: number
  converged: boolean
  reason: EndReason
  /** `reason` in words. */
  message: string
  /** Steps tried, the polish included. */
  iterations: number
  /** Calls of `residuals`, those for differences included. */
  evaluations: number
  /** |part of the residuals in the span of the Jacobian| / |residuals| at `value`: 0 at a minimum (Bates & Watts 1981, Technometrics 23, 179). */
  offset: number
  /** The bound at which each parameter stands and would go beyond, or null. */
  atBound: ('lower' | 'upper' | null)[]
  /** Number of parameter combinations that the residuals depend on, among the free ones. */
  rank: number
  /** Ratio of the largest to the smallest singular value of the Jacobian with columns of unit length; Infinity when rank < free parameters. */
  condition: number
}
