import type { ChiSquareProfile } from './problem'

/** End of a bracketed root search. */
export interface NewtonEnd { beta: number, converged: boolean, iterations: number }

const maxIterations = 100
/** Newton steps shorter than this are taken and end the search: convergence is quadratic, so what is left is of the order of their square. */
const relativeStep = 1e-7

/**
 * Root of d chi2 / d beta by Newton's method inside a bracket that holds a minimum.
 * A step that leaves the bracket or follows a negative curvature is replaced by a Gauss-Newton step or by halving.
 * On return the profile stands at the root.
 *
 * @param beta start inside [low, high]; the profile must have been evaluated there last
 */
export function newtonToMinimum(profile: ChiSquareProfile, beta: number, low: number, high: number): NewtonEnd {
  for (let iterations = 1; iterations <= maxIterations; iterations++) {
    const gradient = profile.gradient
    if (gradient === 0) return { beta, converged: true, iterations }
    if (gradient > 0) high = beta
    else low = beta
    const next = nextPoint(profile, beta, low, high)
    const done = Math.abs(next - beta) <= relativeStep * beta
    beta = next
    profile.evaluate(beta)
    if (done) return { beta, converged: true, iterations }
  }
  return { beta, converged: false, iterations: maxIterations }
}

function nextPoint(profile: ChiSquareProfile, beta: number, low: number, high: number): number {
  const { gradient, curvature, information } = profile
  const newton = curvature > 0 ? beta - gradient / curvature : Number.NaN
  if (newton >= low && newton <= high) return newton
  const gaussNewton = beta - gradient / (2 * information)
  if (curvature <= 0 && gaussNewton >= low && gaussNewton <= high) return gaussNewton
  return 0.5 * (low + high)
}
