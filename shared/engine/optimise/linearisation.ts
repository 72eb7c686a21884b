import { qrFactor, qrTransposeTimes } from '../linalg/qr'
import type { ResolvedOptions } from './defaults'
import type { Point } from './point'

/**
 * The problem linearised at a point, r(p + d) ~ r + J d, in the parameters that are free to move.
 * Columns are divided by their length, so that no unit of a parameter matters (Moré 1978, section 6).
 */
export interface Linearisation {
  /** Indices of the k free parameters. */
  free: number[]
  /** Length n. */
  atBound: ('lower' | 'upper' | null)[]
  /** Lengths of the columns of J, length n. */
  lengths: Float64Array
  /** What the damping multiplies, in units of `lengths`, length n. */
  weights: Float64Array
  /** R of the scaled free columns, row-major k x k. */
  r: Float64Array
  /** First k entries of Q^T r. */
  projected: Float64Array
  /** |projected| / |r|: the relative offset of Bates & Watts 1981 without its degrees of freedom. */
  offset: number
  /** Change of the sum of squares that rounding of the parameters alone can make. */
  rounding: number
  /** Part of its length by which a column must stand out of the span of others to count. */
  resolution: number
}

/**
 * Factorises the Jacobian of a point. A parameter that stands at a bound and would go beyond is not free.
 *
 * @param jacobian row-major m x n, finite
 * @param resolution relative accuracy of its columns; rounding of m terms when not given
 * @example
 * const point = { parameters: Float64Array.of(1), residuals: Float64Array.of(3, 4), sumOfSquares: 25 }
 * linearise(point, Float64Array.of(2, 0), resolveOptions({}, [1])).offset // => 0.6
 */
export function linearise({ parameters, residuals, sumOfSquares }: Point, jacobian: Float64Array, options: ResolvedOptions, resolution: number = residuals.length * Number.EPSILON): Linearisation {
  const { lengths, gradient } = columnSums(jacobian, residuals, parameters.length)
  const atBound = Array.from(parameters, (value, j) => boundReached(value, gradient[j], options.lower[j], options.upper[j]))
  const free = atBound.flatMap((bound, j) => bound === null ? j : [])
  const factors = factorise(jacobian, residuals, lengths, free)
  const norm = Math.sqrt(sumOfSquares)
  const reach = lengths.reduce((sum, length, j) => sum + length * Math.abs(parameters[j]), 0)
  return {
    free, atBound, lengths, ...factors,
    weights: dampingWeights(lengths, parameters, options.scale),
    offset: norm > 0 ? removable(factors, resolution) / norm : 0,
    resolution,
    rounding: Number.EPSILON * norm * (4 * reach + norm),
  }
}

/** Length of the part of the residuals that the columns can remove; directions that stand out of none do not count. */
function removable({ r, projected }: Pick<Linearisation, 'r' | 'projected'>, resolution: number): number {
  const k = projected.length
  return Math.hypot(...projected.filter((_, a) => Math.abs(r[a * k + a]) > resolution))
}

function columnSums(jacobian: Float64Array, residuals: Float64Array, n: number): { lengths: Float64Array, gradient: Float64Array } {
  const lengths = new Float64Array(n)
  const gradient = new Float64Array(n)
  for (let i = 0; i < residuals.length; i++) {
    for (let j = 0; j < n; j++) {
      const value = jacobian[i * n + j]
      lengths[j] += value * value
      gradient[j] += value * residuals[i]
    }
  }
  return { lengths: lengths.map(Math.sqrt), gradient }
}

function boundReached(value: number, gradient: number, lower: number, upper: number): 'lower' | 'upper' | null {
  if (lower === upper || (value <= lower && gradient > 0)) return 'lower'
  return value >= upper && gradient < 0 ? 'upper' : null
}

/**
 * D / length of each column: D_j^2 = length_j^2 + (L / t_j)^2, t_j the size of the parameter, L the largest length_k t_k.
 * The second term keeps the relative changes of all parameters alike: columns that are nearly zero at a poor start
 * (exponentials that have died out) would otherwise be sent far away. Our own choice: with Moré's D alone
 * the sets BoxBOD, MGH10 and MGH17 of NIST StRD are lost from their first start, with this none.
 */
function dampingWeights(lengths: Float64Array, parameters: Float64Array, scale: ArrayLike<number>): Float64Array {
  const size = parameters.map((value, j) => Math.max(Math.abs(value), scale[j]))
  const largest = lengths.reduce((most, length, j) => Math.max(most, length * size[j]), 0)
  return lengths.map((length, j) => length * size[j] > 0 ? Math.sqrt(1 + (largest / (length * size[j])) ** 2) : 1)
}

function factorise(jacobian: Float64Array, residuals: Float64Array, lengths: Float64Array, free: number[]): Pick<Linearisation, 'r' | 'projected'> {
  const n = lengths.length
  const k = free.length
  const scaled = new Float64Array(residuals.length * k)
  for (let i = 0; i < residuals.length; i++) {
    for (let c = 0; c < k; c++) scaled[i * k + c] = lengths[free[c]] > 0 ? jacobian[i * n + free[c]] / lengths[free[c]] : 0
  }
  const qr = qrFactor(scaled, residuals.length, k)
  const r = new Float64Array(k * k)
  for (let a = 0; a < k; a++) for (let b = a; b < k; b++) r[a * k + b] = qr.packed[a * k + b]
  return { r, projected: qrTransposeTimes(qr, residuals).slice(0, k) }
}
