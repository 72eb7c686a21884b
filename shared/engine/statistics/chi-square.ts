import { lowerGamma, upperGamma } from './incomplete-gamma'
import { positiveQuantile } from './quantile'
import { poissonTerm } from './saddle-point'

/** P(chi2 <= x) for `dof` degrees of freedom, dof > 0. */
export function chiSquareCdf(x: number, dof: number): number {
  return lowerGamma(dof / 2, x / 2)
}

/** P(chi2 > x): the p value of a fit. */
export function chiSquareTail(x: number, dof: number): number {
  return upperGamma(dof / 2, x / 2)
}

/**
 * x with P(chi2 <= x) = p; 0 and Infinity at p = 0 and 1.
 *
 * @param q 1 - p, given when it is known better than the subtraction gives it
 */
export function chiSquareQuantile(p: number, dof: number, q = 1 - p): number {
  if (!(p > 0)) return 0
  if (!(q > 0)) return Infinity
  return positiveQuantile(x => chiSquareCdf(x, dof), x => chiSquareTail(x, dof), x => poissonTerm(dof / 2, x / 2) * dof / (2 * x), p, q, dof)
}
