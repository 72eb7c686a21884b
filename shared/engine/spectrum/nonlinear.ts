import { choleskySolve } from '../linalg/cholesky-solve'
import { columnTimes, dot } from './linear-system'
import type { LinearSystem } from './linear-system'

/**
 * Shift and width once areas and continuum are eliminated (variable projection, Golub & Pereyra 1973, in the form of Kaufman 1975):
 * `schur` is the 2 x 2 Gauss-Newton matrix of (shift, ln width) and `gradient` half the downhill slope of chi2.
 */
export class ShiftAndWidth {
  readonly schur = new Float64Array(4)
  readonly gradient = new Float64Array(2)
  /** Change of the linear parameters per unit of shift and of ln width, with the other held: -A^-1 B. */
  readonly response: [Float64Array, Float64Array]
  private readonly dense: [Float64Array, Float64Array]
  private readonly cross: [Float64Array, Float64Array]

  constructor(private readonly system: LinearSystem) {
    const pair = (length: number): [Float64Array, Float64Array] => [new Float64Array(length), new Float64Array(length)]
    this.response = pair(system.size)
    this.cross = pair(system.size)
    this.dense = pair(system.pixels.count)
  }

  /** At the solution that the system holds now. */
  linearise(): void {
    this.system.columns.fillSlopes()
    this.fillDense()
    const { system, dense, cross, response } = this
    const lines = system.columns.lines.length
    for (const a of [0, 1]) {
      for (let i = 0; i < lines; i++) cross[a][i] = columnTimes(system.columns, i, dense[a])
      for (let k = 0; k < system.continuum.length; k++) cross[a][lines + k] = dot(system.continuum[k], dense[a])
      choleskySolve(system.factor, system.size, cross[a], response[a])
      this.gradient[a] = dot(dense[a], system.residual)
    }
    for (const a of [0, 1]) for (const b of [0, 1]) this.schur[2 * a + b] = dot(dense[a], dense[b]) - dot(cross[a], response[b])
  }

  private fillDense(): void {
    const { columns, solution } = this.system
    const [byShift, byLogWidth] = this.dense
    byShift.fill(0)
    byLogWidth.fill(0)
    for (let i = 0; i < columns.lines.length; i++) {
      const at = columns.offset[i] - columns.start[i]
      for (let p = columns.start[i]; p < columns.end[i]; p++) {
        byShift[p] += solution[i] * columns.byShift[at + p]
        byLogWidth[p] += solution[i] * columns.byLogWidth[at + p]
      }
    }
  }
}

export interface Free { shift: boolean, width: boolean }

/** Inverse of the 2 x 2 matrix restricted to the free parameters; null when they are not determined. */
export function invertFree(matrix: ArrayLike<number>, free: Free): [number, number, number] | null {
  const [a, b, , d] = Array.from(matrix)
  if (free.shift && free.width) {
    const determinant = a * d - b * b
    return a > 0 && d > 0 && determinant > 1e-12 * a * d ? [d / determinant, -b / determinant, a / determinant] : null
  }
  if (free.shift) return a > 0 ? [1 / a, 0, 0] : null
  return d > 0 ? [0, 0, 1 / d] : null
}
