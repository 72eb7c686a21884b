import type { CompiledModel } from '../line-model/compiled-model'

/** Data of one envelope fit; arrays have one entry per line of `model`. */
export interface EnvelopeProblem {
  model: CompiledModel
  intensity: Float64Array
  /** 1/sigma; ignored when `factor` is given. */
  inverseSigma: Float64Array
  /** Cholesky factor of the full covariance, row-major n x n, or null for independent lines. */
  factor: Float64Array | null
  /** Scale group of each line, 0 .. bandCount-1. */
  band: Int32Array
  bandCount: number
  /** Search range of beta, 1/K. */
  betaRange: [low: number, high: number]
}

/**
 * chi2 as a function of beta alone: at each beta the scales are at their best non-negative values
 * (variable projection, Golub & Pereyra 1973). Fields describe the last point evaluated.
 */
export interface ChiSquareProfile {
  readonly problem: EnvelopeProblem
  /** chi2 without any model: the sum of squares of the whitened data. */
  readonly dataSquares: number
  chi2: number
  /** d chi2 / d beta */
  gradient: number
  /** d2 chi2 / d beta2, exact */
  curvature: number
  /** Expected (Fisher) information of beta with the scales free; its inverse is var(beta). */
  information: number
  /** The same with the scales known: what `information` is compared with. */
  rawInformation: number
  /** Best scale per band for shapes relative to the model's reference energy and strength unit. */
  scales: Float64Array
  /** d(scale)/d(beta) along the valley floor, per band, in the Gauss-Newton sense. */
  slopes: Float64Array
  evaluate: (beta: number) => number
  /** Covariance of two scales at fixed beta at the last point; zero for a scale at its bound. */
  scaleCovariance: (a: number, b: number) => number
  /** Smallest chi2 on the grid low 2^k, k < count; returns its k. */
  scan: (low: number, count: number) => number
  /** chi2 at the point the last scan returned, to rounding of the sum of squares. */
  scanChi2: number
  /** Straight-line start of beta seen from `beta0` (see `logStart`); NaN when there is none. */
  start: (beta0: number) => number
}
