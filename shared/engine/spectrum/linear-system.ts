import { cholesky } from '../linalg/cholesky'
import { choleskySolve } from '../linalg/cholesky-solve'
import type { LineColumns } from './columns'
import type { FitPixels } from './pixels'

/** A pivot smaller than this part of its diagonal element means that two columns cannot be told apart. */
const smallestPivot = 1e-12

/** Product of two columns over the pixels that both reach. */
function overlap(columns: LineColumns, i: number, j: number): number {
  const { start, end, offset, value } = columns
  const from = Math.max(start[i], start[j])
  const to = Math.min(end[i], end[j])
  const atI = offset[i] - start[i]
  const atJ = offset[j] - start[j]
  let sum = 0
  for (let p = from; p < to; p++) sum += value[atI + p] * value[atJ + p]
  return sum
}

/** Product of column i with a dense vector over all pixels. */
export function columnTimes(columns: LineColumns, i: number, dense: Float64Array): number {
  const at = columns.offset[i] - columns.start[i]
  let sum = 0
  for (let p = columns.start[i]; p < columns.end[i]; p++) sum += columns.value[at + p] * dense[p]
  return sum
}

/** Product of two dense vectors. */
export function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let p = 0; p < a.length; p++) sum += a[p] * b[p]
  return sum
}

/**
 * The linear part of the fit: areas of the lines and coefficients of the continuum, by normal equations that are summed only
 * where columns are not zero. Lines come first, then the continuum.
 */
export class LinearSystem {
  readonly size: number
  readonly solution: Float64Array
  readonly factor: Float64Array
  readonly residual: Float64Array
  chi2 = Infinity
  private readonly matrix: Float64Array
  private readonly right: Float64Array
  private readonly weighted: Float64Array

  /** @param continuum weighted basis vectors over the pixels */
  constructor(readonly pixels: FitPixels, readonly columns: LineColumns, readonly continuum: Float64Array[]) {
    this.size = columns.lines.length + continuum.length
    this.solution = new Float64Array(this.size)
    this.factor = new Float64Array(this.size * this.size)
    this.matrix = new Float64Array(this.size * this.size)
    this.right = new Float64Array(this.size)
    this.residual = new Float64Array(pixels.count)
    this.weighted = pixels.values.map((value, p) => value * pixels.weight[p])
    this.fillContinuum()
  }

  private fillContinuum(): void {
    const first = this.columns.lines.length
    this.continuum.forEach((basis, k) => {
      this.right[first + k] = dot(basis, this.weighted)
      for (let l = 0; l <= k; l++) this.matrix[(first + k) * this.size + first + l] = dot(basis, this.continuum[l])
    })
  }

  private fillLines(): void {
    const { columns, matrix, size } = this
    const count = columns.lines.length
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) matrix[i * size + j] = overlap(columns, i, j)
      for (let k = 0; k < this.continuum.length; k++) matrix[(count + k) * size + i] = columnTimes(columns, i, this.continuum[k])
      this.right[i] = columnTimes(columns, i, this.weighted)
    }
  }

  /** Solves for the columns as they stand. False when the lines cannot be told apart there; the solution is then not usable. */
  solve(): boolean {
    this.fillLines()
    if (!cholesky(this.matrix, this.size, this.factor)) return this.fail()
    for (let i = 0; i < this.size; i++) {
      const pivot = this.factor[i * this.size + i]
      if (pivot * pivot < smallestPivot * this.matrix[i * this.size + i]) return this.fail()
    }
    choleskySolve(this.factor, this.size, this.right, this.solution)
    this.fillResidual()
    this.chi2 = dot(this.residual, this.residual)
    return Number.isFinite(this.chi2)
  }

  private fail(): boolean {
    this.chi2 = Infinity
    return false
  }

  private fillResidual(): void {
    const { residual, columns, solution } = this
    const count = columns.lines.length
    residual.set(this.weighted)
    this.continuum.forEach((basis, k) => {
      const c = solution[count + k]
      for (let p = 0; p < residual.length; p++) residual[p] -= c * basis[p]
    })
    for (let i = 0; i < count; i++) {
      const at = columns.offset[i] - columns.start[i]
      for (let p = columns.start[i]; p < columns.end[i]; p++) residual[p] -= solution[i] * columns.value[at + p]
    }
  }
}
