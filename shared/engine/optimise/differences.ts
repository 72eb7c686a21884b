import { norm } from '../linalg/orthonormalise'
import type { LeastSquaresProblem } from './types'

/** Step of the two-point rule as a part of the parameter: the cube root of the rounding unit balances rounding and curvature (Nocedal & Wright 2006, 8.1). */
const twoPointStep = Math.cbrt(Number.EPSILON)
/** Step of the four-point rule: longer, since its error is of fourth order; short enough for a narrow peak far from zero. */
const fourPointStep = 6e-5

/** What both rules can be trusted to, relative to a column's length, when nothing is known of the model. */
export const differenceResolution = 1e-9

/** Where differences may step. Arrays of length n. */
export interface DifferenceRoom {
  lower: ArrayLike<number>
  upper: ArrayLike<number>
  /** Steps are parts of |p| or of this, whichever is larger; where both are zero, of 1. */
  scale: ArrayLike<number>
}

/**
 * Jacobian by central differences: two points for each parameter on the way, four for the last digits.
 * Where a bound is too near, a one-sided rule of the same order as the two-point one takes its place.
 * Error relative to the column's scale of change: about 1e-10 (two points), 1e-11 (four points, abridged from Abramowitz & Stegun 25.3.24).
 *
 * @param problem its `residuals` are called at points inside the bounds only
 * @param parameters length n; left as they were
 * @param out receives d r_i / d p_j, row-major m x n
 * @param points 2 or 4
 * @returns number of evaluations
 * @example
 * const cube = { residualCount: 1, residuals: (p, r) => { r[0] = p[0] ** 3 } }
 * const slope = new Float64Array(1)
 * differenceJacobian(cube, Float64Array.of(2), { lower: [-Infinity], upper: [Infinity], scale: [0] }, slope, 4) // => 4
 * Number(slope[0].toFixed(9)) // => 12
 */
export function differenceJacobian(problem: LeastSquaresProblem, parameters: Float64Array, room: DifferenceRoom, out: Float64Array, points: 2 | 4 = 2): number {
  const n = parameters.length
  const at = new Float64Array(problem.residualCount)
  let evaluations = 0
  for (let j = 0; j < n; j++) {
    const p = parameters[j]
    for (let i = j; i < out.length; i += n) out[i] = 0
    let noise = 0
    for (const [offset, weight] of rule(p, j, room, points)) {
      parameters[j] = p + offset
      problem.residuals(parameters, at)
      evaluations++
      for (let i = 0; i < at.length; i++) out[i * n + j] += weight * at[i]
      noise += Math.abs(weight) * Number.EPSILON * norm(at)
    }
    parameters[j] = p
    dropNoise(out, j, n, noise)
  }
  return evaluations
}

/** A column that is not longer than the rounding it was made from is no dependence at all. */
function dropNoise(out: Float64Array, j: number, n: number, noise: number): void {
  let square = 0
  for (let i = j; i < out.length; i += n) square += out[i] * out[i]
  if (square <= noise * noise) for (let i = j; i < out.length; i += n) out[i] = 0
}

/** Offsets from p and the weights of the residuals there. */
function rule(p: number, j: number, { lower, upper, scale }: DifferenceRoom, points: 2 | 4): [offset: number, weight: number][] {
  const part = points === 4 ? fourPointStep : twoPointStep
  // As the machine holds it, so that p + h - p is h.
  const h = p + part * (Math.max(Math.abs(p), scale[j]) || 1) - p
  const below = p - lower[j]
  const above = upper[j] - p
  // f' = [f(-2h) - 8 f(-h) + 8 f(h) - f(2h)] / 12h
  if (points === 4 && Math.min(below, above) >= 2 * h) return [[-2 * h, 1 / (12 * h)], [-h, -2 / (3 * h)], [h, 2 / (3 * h)], [2 * h, -1 / (12 * h)]]
  if (Math.min(below, above) >= h) return [[-h, -1 / (2 * h)], [h, 1 / (2 * h)]]
  // Towards the farther bound: f' = [-3 f(0) + 4 f(a) - f(2a)] / 2a.
  const a = above >= below ? Math.min(h, above / 2) : -Math.min(h, below / 2)
  return a === 0 ? [] : [[0, -3 / (2 * a)], [a, 2 / a], [2 * a, -1 / (2 * a)]]
}
