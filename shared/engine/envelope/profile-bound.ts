import { scanPoints } from './scan'
import type { ChiSquareProfile } from './problem'

/**
 * The T that bounds a fit without minimum: seen from the end of the range to which chi2 falls,
 * the first T at which it exceeds `target`. Found on a grid of 2 % and refined by halving.
 *
 * @param side `above`: chi2 falls to the hot end; `below`: to the cold end
 * @returns K, or null when chi2 never exceeds the target inside the range
 */
export function profileBound(profile: ChiSquareProfile, side: 'above' | 'below', target: number): number | null {
  const [low, high] = profile.problem.betaRange
  const grid = scanPoints(low, high, 1.02)
  if (side === 'below') grid.reverse()
  const k = grid.findIndex(beta => profile.evaluate(beta) > target)
  if (k < 1) return null
  let inside = grid[k - 1]
  let outside = grid[k]
  for (let i = 0; i < 50; i++) {
    const middle = 0.5 * (inside + outside)
    if (profile.evaluate(middle) > target) outside = middle
    else inside = middle
  }
  return 1 / inside
}
