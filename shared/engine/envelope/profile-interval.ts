import type { Interval } from '../types'
import type { ChiSquareProfile } from './problem'

/**
 * Interval of T where chi2 stays within `rise` of its minimum (profile likelihood), K.
 * A side on which chi2 never rises that far inside the search range is open (null).
 *
 * @param best beta of the minimum, 1/K
 * @param chi2 its chi2
 * @param rise > 0; 0 gives the point itself
 */
export function profileInterval(profile: ChiSquareProfile, best: number, chi2: number, rise: number): Interval {
  const [low, high] = profile.problem.betaRange
  profile.evaluate(best)
  const sigma = 1 / Math.sqrt(profile.information)
  const cold = crossing(profile, best, high, chi2 + rise, sigma)
  const hot = crossing(profile, best, low, chi2 + rise, sigma)
  return [cold === null ? null : 1 / cold, hot === null ? null : 1 / hot]
}

/** The first beta from `best` towards `end` at which chi2 reaches `target`; null when it does not. */
function crossing(profile: ChiSquareProfile, best: number, end: number, target: number, sigma: number): number | null {
  const direction = Math.sign(end - best)
  let inside = best
  let step = Math.max(sigma, 1e-12 * best)
  for (;;) {
    const outside = direction > 0 ? Math.min(end, inside + step) : Math.max(end, inside - step)
    if (profile.evaluate(outside) >= target) return root(profile, inside, outside, target)
    if (outside === end) return null
    inside = outside
    step *= 1.5
  }
}

/** Newton's method between a point inside and a point outside the target, halving when a step leaves the bracket. */
function root(profile: ChiSquareProfile, inside: number, outside: number, target: number): number {
  let beta = outside
  for (let i = 0; i < 100; i++) {
    const excess = profile.evaluate(beta) - target
    if (excess >= 0) outside = beta
    else inside = beta
    const newton = beta - excess / profile.gradient
    const within = (newton - inside) * (newton - outside) < 0
    const next = within ? newton : 0.5 * (inside + outside)
    if (Math.abs(next - beta) <= 1e-12 * beta) return next
    beta = next
  }
  return beta
}
