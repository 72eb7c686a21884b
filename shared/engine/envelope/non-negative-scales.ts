import { cholesky } from '../linalg/cholesky'
import { choleskySolve } from '../linalg/cholesky-solve'

/**
 * Minimises s^T M s - 2 v^T s for s >= 0 (Lawson & Hanson 1974, ch. 23, on the normal equations).
 *
 * @param normal M, row-major n x n, n small
 * @param right v, length n
 * @param scales receives s
 * @returns the indices whose scale is free (not at zero)
 */
export function nonNegativeScales(normal: Float64Array, right: readonly number[], scales: Float64Array): number[] {
  const n = right.length
  scales.fill(0)
  let active: number[] = []
  for (let round = 0; round < 3 * n + 1; round++) {
    const entering = steepest(normal, right, scales, active)
    if (entering < 0) break
    const tried = solveActive(normal, right, [...active, entering].sort((a, b) => a - b), scales)
    if (!tried) break
    active = tried
  }
  return active
}

/** The inactive index whose increase lowers the objective most steeply; -1 when none does. */
function steepest(normal: Float64Array, right: readonly number[], scales: Float64Array, active: readonly number[]): number {
  const n = right.length
  let best = -1
  let largest = 0
  for (let a = 0; a < n; a++) {
    if (active.includes(a)) continue
    let gradient = right[a]
    for (let b = 0; b < n; b++) gradient -= normal[a * n + b] * scales[b]
    // Compared in units of the diagonal so that weak and strong bands are equals.
    const slope = gradient / Math.sqrt(normal[a * n + a])
    if (slope > largest * (1 + 1e-12) && slope > 1e-13 * Math.abs(right[a]) / Math.sqrt(normal[a * n + a])) {
      largest = slope
      best = a
    }
  }
  return best
}

/** Solves on the active set, stepping back and dropping indices until all are positive; null when the set is singular. */
function solveActive(normal: Float64Array, right: readonly number[], start: number[], scales: Float64Array): number[] | null {
  const n = right.length
  let active = start
  while (active.length > 0) {
    const p = active.length
    const factor = cholesky(active.flatMap(a => active.map(b => normal[a * n + b])), p)
    if (!factor) return null
    const solution = choleskySolve(factor, p, active.map(a => right[a]))
    if (solution.every(value => value > 0)) {
      scales.fill(0)
      active.forEach((a, j) => {
        scales[a] = solution[j]
      })
      return active
    }
    let step = 1
    active.forEach((a, j) => {
      if (solution[j] <= 0) step = Math.min(step, scales[a] / (scales[a] - solution[j]))
    })
    active.forEach((a, j) => {
      scales[a] += step * (solution[j] - scales[a])
    })
    active = active.filter((a, j) => solution[j] > 0 || scales[a] > 1e-14 * Math.abs(solution[j]))
  }
  return active
}
