import type { LineRetrievalInput, MeasuredLine, NoiseKind, ObservableReading } from '../types'
import { defaultTemperatureRange } from '../thresholds'

/** The lines that take part, as arrays; what every fit of a retrieval starts from. */
export interface LineTable {
  reading: ObservableReading
  lines: MeasuredLine[]
  intensity: Float64Array
  /** Standard uncertainties, or their shape when they are known up to a factor only. */
  sigma: Float64Array
  /** Row-major n x n, or null for independent lines. */
  covariance: Float64Array | null
  noise: NoiseKind
  bandScales: 'own' | 'common'
  betaRange: [number, number]
}

/** Builds the table from the lines with the indices `used` of the input. */
export function createLineTable(input: LineRetrievalInput, used: readonly number[]): LineTable {
  const lines = used.map(i => input.lines[i])
  const intensity = Float64Array.from(lines, line => line.intensity)
  const covariance = input.covariance ? subMatrix(input.covariance, input.lines.length, used) : null
  const [cold, hot] = input.temperatureRange ?? defaultTemperatureRange
  return {
    reading: input.reading,
    lines,
    intensity,
    sigma: covariance ? diagonalRoots(covariance, lines.length) : sigmaOf(lines, intensity, input.noise),
    covariance,
    noise: input.noise,
    bandScales: input.bandScales ?? 'own',
    betaRange: [1 / hot, 1 / cold],
  }
}

/** The same table with only the lines at `keep`. */
export function subTable(table: LineTable, keep: readonly number[]): LineTable {
  return {
    ...table,
    lines: keep.map(i => table.lines[i]),
    intensity: Float64Array.from(keep, i => table.intensity[i]),
    sigma: Float64Array.from(keep, i => table.sigma[i]),
    covariance: table.covariance ? subMatrix(table.covariance, table.lines.length, keep) : null,
  }
}

/** Rows and columns `keep` of a row-major n x n matrix. */
export function subMatrix(matrix: ArrayLike<number>, n: number, keep: readonly number[]): Float64Array {
  const out = new Float64Array(keep.length ** 2)
  keep.forEach((row, i) => keep.forEach((column, j) => {
    out[i * keep.length + j] = matrix[row * n + column]
  }))
  return out
}

function diagonalRoots(matrix: Float64Array, n: number): Float64Array {
  return Float64Array.from({ length: n }, (_, i) => Math.sqrt(matrix[i * n + i]))
}

/** Unknown noise: all sigmas equal, in the size of the intensities so that no square overflows. */
function sigmaOf(lines: MeasuredLine[], intensity: Float64Array, noise: NoiseKind): Float64Array {
  if (noise !== 'from-residuals') return Float64Array.from(lines, line => line.sigma ?? Number.NaN)
  const largest = intensity.reduce((a, b) => Math.max(a, Math.abs(b)), 0) || 1
  return new Float64Array(lines.length).fill(largest)
}
