import { leastSquares } from '../linalg/least-squares'
import { qrFactor, qrTimes, qrTransposeTimes } from '../linalg/qr'
import type { QrFactors } from '../linalg/qr'
import { solveLower } from '../linalg/triangular'
import type { ResolvedOptions } from './defaults'
import { differenceJacobian } from './differences'
import type { DifferenceRoom } from './differences'
import type { SeparableProblem } from './separable'

/** Which derivative of the projected residuals is used; the gradient is exact with either. */
export type ProjectionForm = 'kaufman' | 'golub-pereyra'

/**
 * d Phi / d alpha, (m p) x q row-major, from the problem or by differences.
 *
 * @param alpha length q; left as it was
 * @example
 * const slopes = new Float64Array(2)
 * columnSlopes({ data: [2, 4], linearCount: 1, columns: ([a], out) => { out[0] = 1; out[1] = a } }, Float64Array.of(2), resolveOptions({}, [2]), slopes)
 * Number(slopes[1].toFixed(9)) // => 1
 */
export function columnSlopes({ data, linearCount, columns, derivatives }: SeparableProblem, alpha: Float64Array, room: DifferenceRoom, out: Float64Array): void {
  if (derivatives) derivatives(alpha, out)
  else differenceJacobian({ residualCount: data.length * linearCount, residuals: columns }, alpha, room, out, 4)
}

/**
 * Residuals of a separable problem with the linear parameters eliminated: r(alpha) = y - Phi c = P y with P = I - Phi Phi^+
 * (Golub & Pereyra 1973, SIAM J. Numer. Anal. 10, 413, eq. 2.2), and their Jacobian.
 *
 * @example
 * const problem = { data: [2, 4], linearCount: 1, columns: ([a], out) => { out[0] = 1; out[1] = a } }
 * const projected = new Projection(problem, resolveOptions({}, [2]))
 * projected.residuals(Float64Array.of(2), new Float64Array(2))
 * projected.linear // => [2]
 */
export class Projection {
  /** c at the last alpha, length p; not finite where the columns depend on each other. */
  readonly linear: Float64Array
  private readonly m: number
  private readonly p: number
  private readonly phi: Float64Array
  private readonly residual: Float64Array
  private readonly slopes: Float64Array
  private at: Float64Array | null = null
  private qr: QrFactors | null = null

  constructor(private readonly problem: SeparableProblem, private readonly options: ResolvedOptions, private readonly form: ProjectionForm = 'kaufman') {
    this.m = problem.data.length
    this.p = problem.linearCount
    this.linear = new Float64Array(this.p)
    this.phi = new Float64Array(this.m * this.p)
    this.residual = new Float64Array(this.m)
    this.slopes = new Float64Array(this.m * this.p * options.lower.length)
  }

  /** r(alpha), length m; not finite where the columns do not determine c. */
  residuals(alpha: Float64Array, out: Float64Array): void {
    this.solve(alpha)
    out.set(this.residual)
  }

  /**
   * d r / d alpha, row-major m x q. With D_j = d Phi / d alpha_j it is -P D_j c (Kaufman 1975, BIT 15, 49),
   * and in the form of Golub & Pereyra (1973, eq. 4.2) also -(P D_j Phi^+)^T y = -Q R^-T D_j^T r.
   */
  jacobian(alpha: Float64Array, out: Float64Array): void {
    this.solve(alpha)
    columnSlopes(this.problem, alpha, this.options, this.slopes)
    const q = alpha.length
    for (let j = 0; j < q; j++) {
      const column = this.jacobianColumn(j, q)
      for (let i = 0; i < this.m; i++) out[i * q + j] = column ? column[i] : Number.NaN
    }
  }

  private solve(alpha: Float64Array): void {
    if (this.at?.every((value, j) => value === alpha[j])) return
    this.at = Float64Array.from(alpha)
    this.problem.columns(alpha, this.phi)
    const solution = this.phi.every(Number.isFinite) ? leastSquares(this.phi, this.m, this.p, this.problem.data) : null
    this.qr = solution && qrFactor(this.phi, this.m, this.p)
    if (solution) {
      this.linear.set(solution.x)
      this.residual.set(solution.residuals)
    }
    else {
      this.linear.fill(Number.NaN)
      this.residual.fill(Number.NaN)
    }
  }

  /** (D_j c) at row i. */
  private slope(i: number, j: number, q: number): number {
    let sum = 0
    for (let k = 0; k < this.p; k++) sum += this.slopes[(i * this.p + k) * q + j] * this.linear[k]
    return sum
  }

  private jacobianColumn(j: number, q: number): Float64Array | null {
    const { qr, m, p } = this
    if (!qr) return null
    const rotated = qrTransposeTimes(qr, Float64Array.from({ length: m }, (_, i) => -this.slope(i, j, q)))
    // P = Q diag(0, I) Q^T: what lies in the span of Phi goes ...
    rotated.fill(0, 0, p)
    // ... and the second term lies in that span alone.
    if (this.form === 'golub-pereyra') rotated.set(this.spanTerm(j, q))
    return qrTimes(qr, rotated)
  }

  /** -R^-T D_j^T r, length p. */
  private spanTerm(j: number, q: number): Float64Array {
    const { m, p, slopes, residual, qr } = this
    const right = new Float64Array(p)
    for (let i = 0; i < m; i++) for (let k = 0; k < p; k++) right[k] -= slopes[(i * p + k) * q + j] * residual[i]
    const lower = new Float64Array(p * p)
    for (let a = 0; a < p; a++) for (let b = 0; b <= a; b++) lower[a * p + b] = qr!.packed[b * p + a]
    return solveLower(lower, p, right)
  }
}
