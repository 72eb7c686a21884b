import { fisherQuantile, fisherTail } from './fisher-f'

/** P(t > x) for `dof` degrees of freedom, dof > 0. */
export function studentTail(x: number, dof: number): number {
  // Cauchy's distribution: its tails reach where x^2 overflows.
  if (dof === 1) return Math.atan2(1, x) / Math.PI
  const half = fisherTail(x * x, 1, dof) / 2
  return x >= 0 ? half : 1 - half
}

/** P(t <= x). */
export function studentCdf(x: number, dof: number): number {
  return studentTail(-x, dof)
}

/** k with P(|t| <= k) = coverage: 1.837 at 68.27 % and 13.97 at 95.45 % for one degree of freedom. */
export function studentCoverageFactor(coverage: number, dof: number): number {
  return Math.sqrt(fisherQuantile(coverage, 1, dof))
}

/**
 * x with P(t <= x) = p; infinite at p = 0 and 1.
 *
 * @param q 1 - p, given when it is known better than the subtraction gives it
 */
export function studentQuantile(p: number, dof: number, q = 1 - p): number {
  const tail = Math.min(p, q)
  const size = dof === 1 ? 1 / Math.tan(Math.PI * tail) : Math.sqrt(fisherQuantile(Math.abs(q - p), 1, dof, 2 * tail))
  if (p === q) return 0
  return p < q ? -size : size
}
