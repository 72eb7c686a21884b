import type { EnvelopeProblem } from '../envelope/problem'
import { nonNegativeScales } from '../envelope/non-negative-scales'
import { cholesky } from '../linalg/cholesky'
import { choleskySolve } from '../linalg/cholesky-solve'
import { dotProduct } from '../linalg/orthonormalise'
import { solveLower } from '../linalg/triangular'
import { PairDescent } from './pair-descent'

/** Two temperatures of several bands whose lines share a covariance: all 2 B scales are found together. */
export class CoupledBands extends PairDescent {
  /** L^-1 of each gas's column, band by band: the cold bands, then the hot ones. */
  private readonly columns: Float64Array[]
  private readonly all: Float64Array
  private readonly residuals: Float64Array
  private active: number[] = []
  private factor: Float64Array = new Float64Array(0)

  constructor(problem: EnvelopeProblem) {
    super(problem)
    this.columns = Array.from({ length: 2 * problem.bandCount }, () => new Float64Array(problem.model.lineCount))
    this.all = new Float64Array(2 * problem.bandCount)
    this.residuals = new Float64Array(problem.model.lineCount)
  }

  /** Whitening mixes bands: it waits until they have been taken apart. */
  protected override whitenColumns(): void {}

  protected solveScales(): void {
    const { columns, problem: { bandCount: b }, all, y, residuals } = this
    this.fillBandColumns()
    const normal = new Float64Array((2 * b) ** 2)
    columns.forEach((p, i) => columns.forEach((q, j) => {
      if (j <= i) normal[i * 2 * b + j] = normal[j * 2 * b + i] = dotProduct(p, q)
    }))
    this.active = nonNegativeScales(normal, columns.map(column => dotProduct(column, y)), all)
    this.factor = cholesky(this.active.flatMap(i => this.active.map(j => normal[i * 2 * b + j])), this.active.length) ?? new Float64Array(0)
    this.scales[0].set(all.subarray(0, b))
    this.scales[1].set(all.subarray(b))
    residuals.set(y)
    for (const i of this.active) for (let k = 0; k < y.length; k++) residuals[k] -= all[i] * columns[i][k]
    this.chi2 = dotProduct(residuals, residuals)
  }

  private fillBandColumns(): void {
    const { columns, f, problem: { band, bandCount, factor } } = this
    columns.forEach((column, j) => {
      const source = f[j < bandCount ? 0 : 1]
      for (let i = 0; i < column.length; i++) column[i] = band[i] === j % bandCount ? source[i] : 0
      solveLower(factor!, column.length, column, column)
    })
  }

  protected linearise(): void {
    const { gradient, normal, residuals } = this
    const slopes = ([0, 1] as const).map(gas => this.slope(gas))
    slopes.forEach((slope, gas) => {
      gradient[gas] = -dotProduct(slope, residuals)
    })
    const [u, v] = slopes.map(slope => this.withoutColumns(slope))
    normal.set([dotProduct(u, u), dotProduct(u, v), dotProduct(v, v)])
  }

  /** L^-1 (s df / d ln beta). */
  private slope(gas: 0 | 1): Float64Array {
    const { scales, d, problem: { band, factor } } = this
    const slope = d[gas].map((value, i) => scales[gas][band[i]] * value)
    return solveLower(factor!, slope.length, slope, slope)
  }

  /** The part of a vector that the columns in use cannot take over. */
  private withoutColumns(vector: Float64Array): Float64Array {
    const { active, columns, factor } = this
    if (factor.length === 0) return vector
    const share = choleskySolve(factor, active.length, active.map(i => dotProduct(columns[i], vector)))
    return vector.map((value, k) => active.reduce((rest, i, j) => rest - share[j] * columns[i][k], value))
  }
}
