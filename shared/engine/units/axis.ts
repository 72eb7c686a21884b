import type { AirFormulaName } from './air'
import { airToVacuum, shortestAirWavelength } from './air'

export type WavelengthUnit = 'nm' | 'angstrom' | 'um'
export type FrequencyUnit = 'cm-1' | 'GHz' | 'MHz' | 'Hz'
export type PhysicalAxisUnit = WavelengthUnit | FrequencyUnit

/** Speed of light, m/s (exact). */
export const speedOfLight = 299792458

const nanometresPer: Record<WavelengthUnit, number> = { nm: 1, angstrom: 0.1, um: 1000 }
/** x in the unit times vacuum nm = this. */
const productWithNanometre: Record<FrequencyUnit, number> = {
  'cm-1': 1e7,
  'Hz': speedOfLight * 1e9,
  'MHz': speedOfLight * 1e3,
  'GHz': speedOfLight,
}

export interface AxisReading {
  unit: PhysicalAxisUnit | 'pixel' | null
  medium: 'vacuum' | 'air' | null
  airFormula: AirFormulaName
}

export type AxisResult = { wavelength: Float64Array, descending: boolean } | { problem: string }

/** Is the unit one of wavelength, so that a medium must be known? */
export function isWavelengthUnit(unit: string | null): unit is WavelengthUnit {
  return unit !== null && Object.hasOwn(nanometresPer, unit)
}

/** Is the unit one that grows with energy (wavenumber or frequency)? */
export function isFrequencyUnit(unit: string | null): unit is FrequencyUnit {
  return unit !== null && Object.hasOwn(productWithNanometre, unit)
}

function problemOf(axis: ArrayLike<number>, { unit, medium }: AxisReading): string | null {
  if (unit === null) return 'The unit of the axis is not stated.'
  if (unit === 'pixel') return 'The axis counts pixels and no wavelength solution is known: state the wavelength, wavenumber or frequency of each pixel.'
  if (isWavelengthUnit(unit) && medium === null) return 'State whether the wavelengths are in vacuum or in air.'
  if (isFrequencyUnit(unit) && medium === 'air') return `An axis in ${unit} has no air form: wavenumbers and frequencies are those in vacuum.`
  if (axis.length < 2) return 'The axis has fewer than two points.'
  for (let i = 0; i < axis.length; i++) if (!(axis[i] > 0) || axis[i] === Infinity) return `The axis must be positive and finite; point ${i + 1} is ${axis[i]}.`
  return null
}

/** One axis value to vacuum nm; the reading must be a valid one. */
export function pointToVacuumNanometre(x: number, unit: PhysicalAxisUnit, medium: 'vacuum' | 'air', formula: AirFormulaName): number {
  if (isFrequencyUnit(unit)) return productWithNanometre[unit] / x
  const nanometre = x * nanometresPer[unit]
  return medium === 'air' && nanometre >= shortestAirWavelength ? airToVacuum(nanometre, formula) : nanometre
}

/**
 * An axis in any unit to vacuum nm, in the order given. `descending` says that the wavelengths fall, so that the
 * values must be reversed with them (see normaliseSpectrum). An axis that neither rises nor falls throughout is refused.
 * Air wavelengths below 200 nm are taken as vacuum ones.
 */
export function toVacuumNanometre(axis: ArrayLike<number>, reading: AxisReading): AxisResult {
  const problem = problemOf(axis, reading)
  if (problem) return { problem }
  const unit = reading.unit as PhysicalAxisUnit
  const wavelength = Float64Array.from(axis, x => pointToVacuumNanometre(x, unit, reading.medium ?? 'vacuum', reading.airFormula))
  const descending = wavelength[1] < wavelength[0]
  const sign = descending ? -1 : 1
  for (let i = 1; i < wavelength.length; i++) {
    if (!(sign * (wavelength[i] - wavelength[i - 1]) > 0)) return { problem: `The axis must rise or fall throughout; it turns or stands still at point ${i + 1}.` }
  }
  return { wavelength, descending }
}
