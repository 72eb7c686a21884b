import { profileBound } from '../envelope/profile-bound'
import type { LineRetrievalInput } from '../types'
import type { TableFit } from './fit-table'
import { riseOf } from './temperature-value'

/** Why an input cannot be fitted at all, in words; null when it can. */
export function inputProblem(input: LineRetrievalInput, usedCount: number): string | null {
  const [cold, hot] = input.temperatureRange ?? [1, 2]
  if (!(cold > 0 && hot > cold && hot < Infinity)) return 'The temperature range is not two positive numbers in ascending order.'
  if (input.covariance && input.covariance.length !== input.lines.length ** 2) return 'The covariance does not have one row and one column for every line.'
  if (usedCount === 0) return 'No line is used.'
  if (usedCount === 1) return 'One line alone carries no temperature; at least two lines of different energy are needed.'
  return null
}

/** Why a fit gave no temperature, in words; undefined when it gave one. */
export function fitProblem(fitted: TableFit): string | undefined {
  const { fit, dof, table } = fitted
  if (fit.reason === 'no-positive-scale') {
    return table.intensity.every(value => value <= 0) ? 'No used line has a positive intensity.' : 'The intensities fit no positive scale at any temperature.'
  }
  if (dof < 0) return `${table.lines.length} lines do not determine a temperature and ${fitted.bands.length} scales.`
  if (fit.reason === 'no-information') return 'The used lines of a band share one energy, so their ratios do not depend on temperature.'
  if (fit.reason === 'falls-to-hot-end') return `The lines do not bound the temperature: chi2 falls up to the hot end of the search range, ${kelvin(1 / table.betaRange[0])}.${boundWords(fitted, 'above')}`
  if (fit.reason === 'falls-to-cold-end') return `The lines do not bound the temperature: chi2 falls down to the cold end of the search range, ${kelvin(1 / table.betaRange[1])}.${boundWords(fitted, 'below')}`
  if (fit.reason === 'iteration-limit') return 'The fit did not converge.'
  if (fitted.uTemperature === null) return 'The lines are as many as the unknowns and their uncertainties are not known, so the uncertainty of the temperature cannot be known; give sigmas or one more line.'
  return undefined
}

/** The one-sided statement that is left when chi2 has no minimum inside the range. */
function boundWords(fitted: TableFit, side: 'above' | 'below'): string {
  if (fitted.dof < 0 || fitted.varianceFactor === null) return ''
  const bound = profileBound(fitted.profile, side, fitted.fit.chi2 + riseOf(fitted, 2))
  return bound === null ? '' : ` Within the range it is ${side} ${kelvin(bound)} (chi2 rises by what two standard uncertainties allow).`
}

function kelvin(value: number): string {
  return `${Number(value.toPrecision(3))} K`
}
