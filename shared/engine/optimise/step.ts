import { qrFactor, qrTransposeTimes } from '../linalg/qr'
import { solveUpper } from '../linalg/triangular'
import type { Linearisation } from './linearisation'

/**
 * The Levenberg-Marquardt step: minimises |r + J d|^2 + damping |D d|^2 through the QR of [R; sqrt(damping) D]
 * (Moré 1978, 3.2 to 3.4; no normal matrix is formed). Damping 0 is the Gauss-Newton step.
 *
 * @param damping at least 0
 * @returns d, length n, zero for parameters that are not free; null when the columns do not determine it
 * @example
 * const point = { parameters: Float64Array.of(1), residuals: Float64Array.of(3, 4), sumOfSquares: 25 }
 * const linear = linearise(point, Float64Array.of(2, 0), resolveOptions({}, [1]))
 * dampedStep(linear, 0) // => [-1.5]
 * // D^2 = 2 x length^2 for a single parameter.
 * dampedStep(linear, 1) // => [-0.5]
 */
export function dampedStep({ free, lengths, weights, r, projected }: Linearisation, damping: number): Float64Array | null {
  const k = free.length
  const change = new Float64Array(lengths.length)
  if (k === 0) return change
  const rows = damping > 0 ? 2 * k : k
  const stacked = new Float64Array(rows * k)
  stacked.set(r)
  const right = new Float64Array(rows)
  for (let a = 0; a < k; a++) {
    right[a] = -projected[a]
    if (damping > 0) stacked[(k + a) * k + a] = Math.sqrt(damping) * weights[free[a]]
  }
  const qr = qrFactor(stacked, rows, k)
  if (qr.rank < k) return null
  const scaled = solveUpper(qr.packed, k, qrTransposeTimes(qr, right))
  for (let c = 0; c < k; c++) if (lengths[free[c]] > 0) change[free[c]] = scaled[c] / lengths[free[c]]
  return change.every(Number.isFinite) ? change : null
}

/**
 * |r|^2 - |r + J d|^2 of a change d, length n, that may have been shortened by bounds.
 *
 * @example
 * const point = { parameters: Float64Array.of(1), residuals: Float64Array.of(3, 4), sumOfSquares: 25 }
 * predictedReduction(linearise(point, Float64Array.of(2, 0), resolveOptions({}, [1])), Float64Array.of(-1.5)) // => 9
 */
export function predictedReduction({ free, lengths, r, projected }: Linearisation, change: Float64Array): number {
  const k = free.length
  let reduction = 0
  for (let a = 0; a < k; a++) {
    let along = 0
    for (let b = a; b < k; b++) along += r[a * k + b] * lengths[free[b]] * change[free[b]]
    reduction -= along * (2 * projected[a] + along)
  }
  return reduction
}
