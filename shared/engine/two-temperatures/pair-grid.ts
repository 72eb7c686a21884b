import { nonNegativeScales } from '../envelope/non-negative-scales'
import { dotProduct } from '../linalg/orthonormalise'
import type { PairModel } from './pair-model'

/** Neighbouring temperatures of the grid differ by about this factor: nearer pairs look alike to any lines. */
const ratio = 1.25
/** Bounds the work of one search where the scales of many bands are coupled by their covariance. */
const mostWork = 4e5

/** A start for the fit of two temperatures. */
export interface PairStart {
  /** chi2 there. */
  chi2: number
  /** As of `PairModel`. */
  parameters: Float64Array
}

/** Number of temperatures on the grid. */
function gridSize({ problem: { betaRange: [low, high], factor }, bandCount }: PairModel): number {
  const fine = Math.round(Math.log(high / low) / Math.log(ratio)) + 1
  const perPair = factor && bandCount > 1 ? (2 * bandCount) ** 3 : 1
  return Math.max(3, Math.min(fine, Math.floor(Math.sqrt(2 * mostWork / perPair))))
}

/**
 * All pairs of temperatures on a geometric grid over the search range, with their products worked out once, so that many data of
 * the same lines (a bootstrap) are searched quickly. Scales are the best ones that are not negative.
 */
export class PairGrid {
  /** Rising, 1/K. */
  readonly betas: number[]
  /** Whitened columns by grid point and band. */
  private readonly columns: Float64Array[][]
  /** Products of columns [k][b] and [l][c], k <= l, at ((k K + l) B + b) B + c. */
  private readonly products: Float64Array

  constructor(private readonly model: PairModel) {
    const [low, high] = model.problem.betaRange
    const count = gridSize(model)
    this.betas = Array.from({ length: count }, (_, k) => low * (high / low) ** (k / (count - 1)))
    const bands = Array.from({ length: model.bandCount }, (_, b) => b)
    this.columns = this.betas.map(beta => bands.map(band => model.bandColumn(beta, band)))
    this.products = new Float64Array((count * model.bandCount) ** 2)
    this.fillProducts()
  }

  private fillProducts(): void {
    const { columns, model: { bandCount } } = this
    for (let k = 0; k < columns.length; k++) {
      for (let l = k; l < columns.length; l++) {
        for (let b = 0; b < bandCount; b++) for (let c = 0; c < bandCount; c++) this.products[this.place(k, l, b, c)] = dotProduct(columns[k][b], columns[l][c])
      }
    }
  }

  private place(k: number, l: number, b: number, c: number): number {
    const { betas, model: { bandCount } } = this
    return ((k * betas.length + l) * bandCount + b) * bandCount + c
  }

  /**
   * The grid's local minima of chi2 over pairs with two different temperatures, the best first.
   *
   * @param whitened the data in units of their noise, length n
   * @param most how many at most
   */
  starts(whitened: Float64Array, most: number): PairStart[] {
    const count = this.betas.length
    const right = this.columns.map(columns => columns.map(column => dotProduct(column, whitened)))
    const gains = new Float64Array(count * count)
    for (let k = 0; k < count; k++) for (let l = k + 1; l < count; l++) gains[k * count + l] = this.gain(k, l, right)
    const peaks: [gain: number, k: number, l: number][] = []
    for (let k = 0; k < count; k++) for (let l = k + 1; l < count; l++) if (isPeak(gains, count, k, l)) peaks.push([gains[k * count + l], k, l])
    const squares = dotProduct(whitened, whitened)
    return peaks.sort((a, b) => b[0] - a[0]).slice(0, most).map(([gain, k, l]) => ({ chi2: squares - gain, parameters: this.parametersAt(k, l, right) }))
  }

  private normal(k: number, l: number): Float64Array {
    const { bandCount: b } = this.model
    const normal = new Float64Array(4 * b * b)
    for (let i = 0; i < 2 * b; i++) {
      for (let j = 0; j < 2 * b; j++) {
        const [p, q] = [i < b ? k : l, j < b ? k : l]
        normal[i * 2 * b + j] = p <= q ? this.products[this.place(p, q, i % b, j % b)] : this.products[this.place(q, p, j % b, i % b)]
      }
    }
    return normal
  }

  /** By how much the best scales lower chi2 below the sum of squares of the data. */
  private gain(k: number, l: number, right: number[][]): number {
    const { bandCount, problem } = this.model
    if (bandCount === 1 || !problem.factor) {
      // Bands do not touch: each by itself.
      let sum = 0
      for (let b = 0; b < bandCount; b++) sum += pairGain(this.products[this.place(k, k, b, b)], this.products[this.place(k, l, b, b)], this.products[this.place(l, l, b, b)], right[k][b], right[l][b])
      return sum
    }
    const scales = new Float64Array(2 * bandCount)
    const v = [...right[k], ...right[l]]
    nonNegativeScales(this.normal(k, l), v, scales)
    return v.reduce((sum, value, i) => sum + value * scales[i], 0)
  }

  private parametersAt(k: number, l: number, right: number[][]): Float64Array {
    const { bandCount } = this.model
    const scales = new Float64Array(2 * bandCount)
    nonNegativeScales(this.normal(k, l), [...right[k], ...right[l]], scales)
    // Grid point l has the larger beta: it is the cold one.
    return Float64Array.of(this.betas[l], this.betas[k], ...scales.subarray(bandCount), ...scales.subarray(0, bandCount))
  }
}

/** v^T s at the non-negative minimum of s^T M s - 2 v^T s for two scales, in closed form. */
function pairGain(aa: number, ab: number, bb: number, va: number, vb: number): number {
  const alone = Math.max(va > 0 ? va * va / aa : 0, vb > 0 ? vb * vb / bb : 0)
  const determinant = aa * bb - ab * ab
  const [sa, sb] = [va * bb - vb * ab, vb * aa - va * ab]
  return determinant > 1e-14 * aa * bb && sa > 0 && sb > 0 ? (va * sa + vb * sb) / determinant : alone
}

/** No neighbour gains more; those on the diagonal, one temperature, do not count. */
function isPeak(gains: Float64Array, count: number, k: number, l: number): boolean {
  const own = gains[k * count + l]
  for (let p = Math.max(0, k - 1); p <= Math.min(count - 1, k + 1); p++) {
    for (let q = Math.max(p + 1, l - 1); q <= Math.min(count - 1, l + 1); q++) if (gains[p * count + q] > own) return false
  }
  return true
}
