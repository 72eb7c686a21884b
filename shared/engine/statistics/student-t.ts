import { fisherQuantile, fisherTail } from './fisher-f'

/** P(t > x) for `dof` degrees of freedom, dof > 0. */
export function studentTail(x: number, dof: number): number {
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

/** x with P(t <= x) = p; infinite at p = 0 and 1. */
export function studentQuantile(p: number, dof: number): number {
  const tail = 2 * Math.min(p, 1 - p)
  const size = Math.sqrt(fisherQuantile(Math.abs(1 - 2 * p), 1, dof, tail))
  return p < 0.5 ? -size : size
}
