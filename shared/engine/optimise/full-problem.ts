import type { ResolvedOptions } from './defaults'
import { columnSlopes } from './projection'
import type { SeparableProblem } from './separable'
import type { LeastSquaresProblem } from './types'

/**
 * A separable problem as one in all its parameters, alpha (q) then c (p): residuals y - Phi(alpha) c.
 *
 * @param room bounds and scales of alpha, for differences
 * @example
 * const separable = { data: [2, 4], linearCount: 1, columns: ([a], out) => { out[0] = 1; out[1] = a } }
 * const residuals = new Float64Array(2)
 * fullProblem(separable, resolveOptions({}, [2])).residuals(Float64Array.of(3, 1), residuals)
 * residuals // => [1, 1]
 */
export function fullProblem(problem: SeparableProblem, room: ResolvedOptions): LeastSquaresProblem {
  const { data, linearCount: p, columns } = problem
  const m = data.length
  const q = room.lower.length
  const phi = new Float64Array(m * p)
  const slopes = new Float64Array(m * p * q)
  return {
    residualCount: m,
    residuals: (parameters, out) => {
      columns(parameters.slice(0, q), phi)
      for (let i = 0; i < m; i++) {
        let sum = data[i]
        for (let k = 0; k < p; k++) sum -= phi[i * p + k] * parameters[q + k]
        out[i] = sum
      }
    },
    // d r / d (alpha, c) = (-D_j c, -Phi), row-major m x (q + p)
    jacobian: (parameters, out) => {
      const alpha = parameters.slice(0, q)
      columns(alpha, phi)
      columnSlopes(problem, alpha, room, slopes)
      for (let i = 0; i < m; i++) {
        for (let j = 0; j < q; j++) {
          let sum = 0
          for (let k = 0; k < p; k++) sum -= slopes[(i * p + k) * q + j] * parameters[q + k]
          out[i * (q + p) + j] = sum
        }
        for (let k = 0; k < p; k++) out[i * (q + p) + q + k] = -phi[i * p + k]
      }
    },
  }
}
