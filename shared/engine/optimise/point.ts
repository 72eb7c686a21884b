import { differenceJacobian, differenceResolution } from './differences'
import type { ResolvedOptions } from './defaults'
import type { LeastSquaresProblem } from './types'

/** A place in parameter space with what is known there. */
export interface Point {
  /** Length n. */
  parameters: Float64Array
  /** Length m. */
  residuals: Float64Array
  /** Infinity where a residual is not finite. */
  sumOfSquares: number
}

/**
 * A problem with its bounds, its evaluations counted.
 *
 * @example
 * const evaluator = new Evaluator({ residualCount: 1, residuals: (p, r) => { r[0] = p[0] - 1 } }, resolveOptions({ upper: [4] }, [3]))
 * evaluator.at(Float64Array.of(3)).sumOfSquares // => 4
 * evaluator.clamp(Float64Array.of(9)) // => [4]
 */
export class Evaluator {
  evaluations = 0
  /** m */
  readonly m: number
  /** Relative accuracy of the Jacobian's columns. */
  readonly resolution: number

  /** @param resolution of a Jacobian that is given; rounding of m terms when absent */
  constructor(private readonly problem: LeastSquaresProblem, private readonly options: ResolvedOptions, resolution?: number) {
    this.m = problem.residualCount
    this.resolution = resolution ?? (problem.jacobian ? this.m * Number.EPSILON : differenceResolution)
  }

  get usesDifferences(): boolean {
    return this.problem.jacobian === undefined
  }

  at(parameters: Float64Array): Point {
    const residuals = new Float64Array(this.m)
    this.problem.residuals(parameters, residuals)
    this.evaluations++
    let sumOfSquares = 0
    for (let i = 0; i < this.m; i++) sumOfSquares += residuals[i] * residuals[i]
    return { parameters, residuals, sumOfSquares: Number.isFinite(sumOfSquares) ? sumOfSquares : Infinity }
  }

  /** The point that a change leads to, moved into the bounds. */
  after(point: Point, change: Float64Array): Point {
    return this.at(this.clamp(point.parameters.map((value, j) => value + change[j])))
  }

  /** Writes the Jacobian, row-major m x n; false when a derivative is not finite. */
  jacobian({ parameters }: Point, out: Float64Array, points: 2 | 4 = 2): boolean {
    if (this.problem.jacobian) this.problem.jacobian(parameters, out)
    else this.evaluations += differenceJacobian(this.problem, parameters, this.options, out, points)
    for (let i = 0; i < out.length; i++) if (!Number.isFinite(out[i])) return false
    return true
  }

  /** The nearest place inside the bounds. */
  clamp(parameters: Float64Array): Float64Array {
    const { lower, upper } = this.options
    return parameters.map((value, j) => Math.min(upper[j], Math.max(lower[j], value)))
  }
}
