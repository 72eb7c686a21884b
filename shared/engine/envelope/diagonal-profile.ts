import { createShapes, evaluateShapes } from '../line-model/shapes'
import type { Shapes } from '../line-model/shapes'
import { logStart } from './log-start'
import type { ChiSquareProfile, EnvelopeProblem } from './problem'
import { scanByEvaluation } from './scan'

/** Independent lines, any observable, any number of components and bands. */
export class DiagonalProfile implements ChiSquareProfile {
  chi2 = 0
  gradient = 0
  curvature = 0
  information = 0
  rawInformation = 0
  scanChi2 = 0
  readonly dataSquares: number
  readonly scales: Float64Array
  readonly slopes: Float64Array
  private readonly shapes: Shapes
  /** Per band: y.f, f.f, f.f', r.f' in units of sigma. */
  private readonly yf: Float64Array
  private readonly ff: Float64Array
  private readonly fd: Float64Array
  private readonly rd: Float64Array

  constructor(readonly problem: EnvelopeProblem) {
    const bands = problem.bandCount
    this.scales = new Float64Array(bands)
    this.slopes = new Float64Array(bands)
    this.shapes = createShapes(problem.model.lineCount)
    this.dataSquares = problem.intensity.reduce((sum, value, i) => sum + (value * problem.inverseSigma[i]) ** 2, 0)
    this.yf = new Float64Array(bands)
    this.ff = new Float64Array(bands)
    this.fd = new Float64Array(bands)
    this.rd = new Float64Array(bands)
  }

  evaluate(beta: number): number {
    evaluateShapes(this.problem.model, beta, this.shapes)
    this.projectScales()
    this.accumulateResiduals()
    return this.chi2
  }

  private projectScales(): void {
    const { intensity, inverseSigma, band, bandCount } = this.problem
    const { value, first } = this.shapes
    this.yf.fill(0)
    this.ff.fill(0)
    this.fd.fill(0)
    for (let i = 0; i < value.length; i++) {
      const q = inverseSigma[i]
      const f = value[i] * q
      this.yf[band[i]] += intensity[i] * q * f
      this.ff[band[i]] += f * f
      this.fd[band[i]] += f * first[i] * q
    }
    for (let b = 0; b < bandCount; b++) this.scales[b] = this.yf[b] > 0 ? this.yf[b] / this.ff[b] : 0
  }

  private accumulateResiduals(): void {
    const { intensity, inverseSigma, band, bandCount } = this.problem
    const { value, first, second } = this.shapes
    this.rd.fill(0)
    let chi2 = 0, gradient = 0, raw = 0, information = 0, bend = 0
    for (let i = 0; i < value.length; i++) {
      const b = band[i]
      const q = inverseSigma[i]
      const s = this.scales[b]
      const r = (intensity[i] - s * value[i]) * q
      const d = first[i] * q
      chi2 += r * r
      this.rd[b] += r * d
      gradient -= 2 * r * s * d
      bend += s * s * d * d - r * s * second[i] * q
      raw += s * s * d * d
      if (s > 0) {
        const centred = s * (d - this.fd[b] / this.ff[b] * value[i] * q)
        information += centred * centred
      }
    }
    for (let b = 0; b < bandCount; b++) {
      const active = this.scales[b] > 0
      const mixed = this.scales[b] * this.fd[b] - this.rd[b]
      if (active) bend -= mixed * mixed / this.ff[b]
      this.slopes[b] = active ? -this.scales[b] * this.fd[b] / this.ff[b] : 0
    }
    this.chi2 = chi2
    this.gradient = gradient
    this.curvature = 2 * bend
    this.information = information
    this.rawInformation = raw
  }

  scaleCovariance(a: number, b: number): number {
    return a === b && this.scales[a] > 0 ? 1 / this.ff[a] : 0
  }

  scan(low: number, count: number): number {
    return scanByEvaluation(this, low, count)
  }

  start(beta0: number): number {
    return logStart(this.problem, beta0)
  }
}
