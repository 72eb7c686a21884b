import { cholesky } from '../linalg/cholesky'
import { choleskySolve } from '../linalg/cholesky-solve'
import { solveLower, solveLowerTransposed } from '../linalg/triangular'
import { createShapes, evaluateShapes } from '../line-model/shapes'
import type { Shapes } from '../line-model/shapes'
import { nonNegativeScales } from './non-negative-scales'
import { logStart } from './log-start'
import type { ChiSquareProfile, EnvelopeProblem } from './problem'
import { scanByEvaluation } from './scan'

/** Lines with a full covariance C = L L^T: everything is multiplied by L^-1 first. */
export class WhitenedProfile implements ChiSquareProfile {
  chi2 = 0
  gradient = 0
  curvature = 0
  information = 0
  rawInformation = 0
  scanChi2 = 0
  readonly dataSquares: number
  readonly scales: Float64Array
  readonly slopes: Float64Array
  private readonly factor: Float64Array
  private readonly shapes: Shapes
  /** L^-1 y */
  private readonly data: Float64Array
  /** L^-1 f of each band. */
  private readonly columns: Float64Array[]
  /** Indices of bands whose scale is not at its bound, and the Cholesky factor of their normal matrix. */
  private active: number[] = []
  private normalFactor: Float64Array = new Float64Array(0)

  constructor(readonly problem: EnvelopeProblem) {
    const n = problem.model.lineCount
    if (!problem.factor) throw new TypeError('A whitened profile needs the factor of the covariance.')
    this.factor = problem.factor
    this.scales = new Float64Array(problem.bandCount)
    this.slopes = new Float64Array(problem.bandCount)
    this.shapes = createShapes(n)
    this.data = solveLower(this.factor, n, problem.intensity)
    this.dataSquares = dot(this.data, this.data)
    this.columns = Array.from({ length: problem.bandCount }, () => new Float64Array(n))
  }

  evaluate(beta: number): number {
    const { model, band, bandCount } = this.problem
    const n = model.lineCount
    evaluateShapes(model, beta, this.shapes)
    for (let b = 0; b < bandCount; b++) {
      const column = this.columns[b]
      for (let i = 0; i < n; i++) column[i] = band[i] === b ? this.shapes.value[i] : 0
      solveLower(this.factor, n, column, column)
    }
    const normal = this.normalMatrix()
    this.active = nonNegativeScales(normal, this.columns.map(column => dot(column, this.data)), this.scales)
    this.normalFactor = cholesky(submatrix(normal, bandCount, this.active), this.active.length) ?? new Float64Array(this.active.length ** 2)
    this.differentiate()
    return this.chi2
  }

  private normalMatrix(): Float64Array {
    const bands = this.problem.bandCount
    const normal = new Float64Array(bands * bands)
    for (let a = 0; a < bands; a++) {
      for (let b = 0; b <= a; b++) {
        normal[a * bands + b] = dot(this.columns[a], this.columns[b])
        normal[b * bands + a] = normal[a * bands + b]
      }
    }
    return normal
  }

  private differentiate(): void {
    const { model, band } = this.problem
    const n = model.lineCount
    const { first, second } = this.shapes
    const r = Float64Array.from(this.data)
    for (const b of this.active) for (let i = 0; i < n; i++) r[i] -= this.scales[b] * this.columns[b][i]
    // d = L^-1 (d model / d beta at fixed scales); z = C^-1 (data - model)
    const d = new Float64Array(n)
    for (let i = 0; i < n; i++) d[i] = this.scales[band[i]] * first[i]
    solveLower(this.factor, n, d, d)
    const z = solveLowerTransposed(this.factor, n, r)
    const rd = new Float64Array(this.problem.bandCount)
    let bend = 0
    for (let i = 0; i < n; i++) {
      rd[band[i]] += z[i] * first[i]
      bend -= z[i] * this.scales[band[i]] * second[i]
    }
    const p = this.active.length
    const fd = Float64Array.from(this.active, b => dot(this.columns[b], d))
    const slope = choleskySolve(this.normalFactor, p, fd)
    const mixed = Float64Array.from(this.active, (b, j) => fd[j] - rd[b])
    const mixedSolved = choleskySolve(this.normalFactor, p, mixed)
    const centred = Float64Array.from(d)
    this.slopes.fill(0)
    this.active.forEach((b, j) => {
      this.slopes[b] = -slope[j]
      for (let i = 0; i < n; i++) centred[i] -= slope[j] * this.columns[b][i]
    })
    this.chi2 = dot(r, r)
    this.gradient = -2 * dot(r, d)
    this.rawInformation = dot(d, d)
    this.curvature = 2 * (bend + this.rawInformation - dot(mixed, mixedSolved))
    this.information = dot(centred, centred)
  }

  scaleCovariance(a: number, b: number): number {
    const j = this.active.indexOf(a)
    const k = this.active.indexOf(b)
    if (j < 0 || k < 0) return 0
    const unit = new Float64Array(this.active.length)
    unit[k] = 1
    return choleskySolve(this.normalFactor, this.active.length, unit)[j]
  }

  scan(low: number, count: number): number {
    return scanByEvaluation(this, low, count)
  }

  start(beta0: number): number {
    return logStart(this.problem, beta0)
  }
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i]
  return sum
}

function submatrix(matrix: Float64Array, n: number, keep: readonly number[]): Float64Array {
  return Float64Array.from(keep.flatMap(a => keep.map(b => matrix[a * n + b])))
}
