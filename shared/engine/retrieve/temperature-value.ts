import { profileInterval } from '../envelope/profile-interval'
import { normalCoverage } from '../statistics/normal'
import { studentCoverageFactor } from '../statistics/student-t'
import type { Interval, TemperatureValue } from '../types'
import type { TableFit } from './fit-table'

/**
 * T with Fisher uncertainty and profile-likelihood intervals of 68.27 % and 95.45 % (k = 1 and 2).
 * Known noise: chi2 rises by k^2. Relative noise: by F(1, dof) = t^2 times chi2/dof (dof 1: k = 1.84 and 13.97).
 *
 * @returns null when the fit failed or its noise cannot be known
 */
export function temperatureValue(fitted: TableFit): TemperatureValue | null {
  if (fitted.temperature === null || fitted.uTemperature === null) return null
  return {
    value: fitted.temperature,
    uNoise: fitted.uTemperature,
    uSystematic: 0,
    interval68: intervalOf(fitted, 1),
    interval95: intervalOf(fitted, 2),
    unit: 'K',
  }
}

function intervalOf(fitted: TableFit, k: number): Interval {
  const { profile, fit } = fitted
  return profileInterval(profile, fit.beta, fit.chi2, riseOf(fitted, k))
}

/** Rise of chi2 at the ends of the interval of k standard uncertainties. */
export function riseOf({ table, dof, varianceFactor }: TableFit, k: number): number {
  if (table.noise === 'absolute') return k * k
  return studentCoverageFactor(normalCoverage(k), dof) ** 2 * (varianceFactor ?? 0)
}
