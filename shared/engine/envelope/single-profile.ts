import type { ChiSquareProfile, EnvelopeProblem } from './problem'

/** Squares of smaller exponentials would be denormal, which is slow and tells nothing. */
const smallest = 1e-150

/**
 * The lean case: independent single-component lines of one scale and phi = e^{-e beta}.
 * The same numbers as `DiagonalProfile`, without its indirections; a 14-line fit takes a few microseconds.
 */
export class SingleProfile implements ChiSquareProfile {
  chi2 = 0
  gradient = 0
  curvature = 0
  information = 0
  rawInformation = 0
  scanChi2 = 0
  dataSquares = 0
  readonly scales = new Float64Array(1)
  readonly slopes = new Float64Array(1)
  private readonly n: number
  /** Per line: y/sigma, w/sigma, e and workspace. */
  private readonly y: Float64Array
  private readonly w: Float64Array
  private readonly e: Float64Array
  private readonly f: Float64Array
  private ff = 0

  constructor(readonly problem: EnvelopeProblem) {
    this.n = problem.model.lineCount
    this.y = new Float64Array(this.n)
    this.w = new Float64Array(this.n)
    this.f = new Float64Array(this.n)
    this.e = problem.model.energy
    this.load()
  }

  /** Reads intensities and sigmas of the problem again: many tables of the same lines need one profile. */
  load(): void {
    const { model: { amplitude }, intensity, inverseSigma } = this.problem
    this.dataSquares = 0
    for (let i = 0; i < this.n; i++) {
      this.y[i] = intensity[i] * inverseSigma[i]
      this.dataSquares += this.y[i] * this.y[i]
      this.w[i] = amplitude[i] * inverseSigma[i]
    }
  }

  static suits(problem: EnvelopeProblem): boolean {
    const { model, factor, bandCount } = problem
    return factor === null && bandCount === 1 && model.kind === 'plain' && model.energy.length === model.lineCount
  }

  evaluate(beta: number): number {
    const { n, y, w, e, f } = this
    let yf = 0, ff = 0, fd = 0
    for (let i = 0; i < n; i++) {
      const value = w[i] * Math.exp(-e[i] * beta)
      f[i] = value
      yf += y[i] * value
      ff += value * value
      fd -= value * value * e[i]
    }
    const s = yf > 0 ? yf / ff : 0
    const mean = ff > 0 ? fd / ff : 0
    let chi2 = 0, rd = 0, rdd = 0, information = 0
    for (let i = 0; i < n; i++) {
      const value = f[i]
      const energy = e[i]
      const d = -energy * value
      const r = y[i] - s * value
      const centred = d - mean * value
      chi2 += r * r
      rd += r * d
      rdd -= r * d * energy
      information += centred * centred
    }
    // f.f' = mean f.f, so |f'|^2 = information + mean^2 f.f
    const mixed = s * fd - rd
    const raw = information + mean * mean * ff
    this.ff = ff
    this.scales[0] = s
    this.slopes[0] = -s * mean
    this.information = s * s * information
    this.rawInformation = s * s * raw
    this.curvature = s > 0 ? 2 * (s * s * raw - s * rdd - mixed * mixed / ff) : 0
    this.gradient = -2 * s * rd
    this.chi2 = chi2
    return chi2
  }

  scaleCovariance(): number {
    return this.scales[0] > 0 ? 1 / this.ff : 0
  }

  /** As `logStart`, in place: weights (I/sigma)^2, positive intensities only. */
  start(): number {
    const { n, y, w, e } = this
    let sw = 0, se = 0, sl = 0, see = 0, sel = 0
    for (let i = 0; i < n; i++) {
      if (!(y[i] > 0 && w[i] > 0)) continue
      const weight = y[i] * y[i]
      const l = Math.log(y[i] / w[i])
      const we = weight * e[i]
      sw += weight
      se += we
      sl += weight * l
      see += we * e[i]
      sel += we * l
    }
    const spread = see - se * se / sw
    return spread > 0 ? (se * sl / sw - sel) / spread : Number.NaN
  }

  /** The grid doubles beta, so each exponential is the square of the one before. */
  scan(low: number, count: number): number {
    const { n, e, f } = this
    let best = 0
    let largest = 0
    for (let i = 0; i < n; i++) f[i] = Math.exp(-e[i] * low)
    for (let k = 0; k < count; k++) {
      const gain = this.gainAndSquare()
      if (gain > largest) {
        largest = gain
        best = k
      }
    }
    this.scanChi2 = this.dataSquares - largest
    return best
  }

  /** By how much the best scale lowers chi2 for the exponentials in `f`, which are squared on the way; two lines at a time to keep the sums short. */
  private gainAndSquare(): number {
    const { n, y, w, f } = this
    let yf = 0, ff = 0, yf2 = 0, ff2 = 0
    let i = 0
    for (; i + 1 < n; i += 2) {
      const a = f[i]
      const b = f[i + 1]
      const p = w[i] * a
      const q = w[i + 1] * b
      f[i] = a > smallest ? a * a : 0
      f[i + 1] = b > smallest ? b * b : 0
      yf += y[i] * p
      yf2 += y[i + 1] * q
      ff += p * p
      ff2 += q * q
    }
    if (i < n) {
      const p = w[i] * f[i]
      f[i] *= f[i]
      yf += y[i] * p
      ff += p * p
    }
    yf += yf2
    // In this order so that steep tables overflow to a comparison that fails, not to an infinite gain.
    return yf > 0 ? yf / (ff + ff2) * yf : 0
  }
}
