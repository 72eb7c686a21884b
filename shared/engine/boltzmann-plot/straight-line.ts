import type { PlotPoint } from './plot-points'

/** Weighted straight line through a Boltzmann plot with one slope and an intercept per band. */
export interface StraightLine {
  /** -slope on C2 E: 1/T, 1/K; may be zero or negative. */
  beta: number
  /** Standard uncertainty from the points' sigmas. */
  uBeta: number
  /** Sum of squared weighted residuals and its degrees of freedom. */
  chi2: number
  dof: number
}

interface Sums { w: number, e: number, y: number }

/** Weighted least squares of ln(I/w) on energy, weights 1/sigma^2; null when no band has two energies. Points of zero sigma count alike. */
export function fitStraightLine(points: readonly PlotPoint[]): StraightLine | null {
  const exact = points.every(point => point.sigma === 0)
  const weightOf = (point: PlotPoint) => exact ? 1 : 1 / point.sigma ** 2
  const means = new Map<string, Sums>()
  for (const point of points) {
    const sums = means.get(point.band) ?? { w: 0, e: 0, y: 0 }
    const weight = weightOf(point)
    means.set(point.band, { w: sums.w + weight, e: sums.e + weight * point.energy, y: sums.y + weight * point.y })
  }
  let see = 0
  let sey = 0
  let syy = 0
  for (const point of points) {
    const { w, e, y } = means.get(point.band)!
    const weight = weightOf(point)
    const de = point.energy - e / w
    const dy = point.y - y / w
    see += weight * de * de
    sey += weight * de * dy
    syy += weight * dy * dy
  }
  if (!(see > 0 && see < Infinity)) return null
  const beta = -sey / see
  return { beta, uBeta: exact ? 0 : 1 / Math.sqrt(see), chi2: exact ? 0 : Math.max(0, syy - sey * sey / see), dof: points.length - 1 - means.size }
}
