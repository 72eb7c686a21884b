import { airShift } from '#shared/engine/units/air'
import { isFrequencyUnit, isWavelengthUnit, pointToVacuumNanometre } from '#shared/engine/units/axis'
import { airFormulas, axisUnits, type AirFormula, type AxisUnit } from '#shared/types/spectrum'

export const unitNames: Record<AxisUnit, string> = {
  'nm': 'nm', 'angstrom': 'Angstrom', 'um': 'micrometre', 'cm-1': 'cm⁻¹', 'GHz': 'GHz', 'MHz': 'MHz', 'Hz': 'Hz', 'pixel': 'pixel number',
}
export const airFormulaNames: Record<AirFormula, string> = {
  'ciddor1996': 'Ciddor 1996', 'edlen1966': 'Edlén 1966', 'edlen1953': 'Edlén 1953', 'peck-reeder1972': 'Peck & Reeder 1972',
}
export const airFormulaOptions = airFormulas.map(value => ({ value, label: airFormulaNames[value] }))

const scales = [{ unit: 'm', nanometres: 1e9 }, { unit: 'mm', nanometres: 1e6 }, { unit: 'µm', nanometres: 1e4, per: 1e3 }, { unit: 'nm', nanometres: 0, per: 1 }]

/** Two wavelengths in the unit that suits them. */
function wavelengthRange(ends: number[]): string {
  const [from, to] = ends.sort((a, b) => a - b) as [number, number]
  const { unit, nanometres, per = nanometres } = scales.find(scale => to >= scale.nanometres)!
  const short = (value: number) => Number((value / per).toPrecision(5)).toString()
  return `${short(from)}–${short(to)} ${unit}`
}

/** What the ends of an axis would be in vacuum nanometres under each unit, so that the right one is seen at a glance. */
export function unitOptions(from: number, to: number): { value: AxisUnit, label: string, hint: string }[] {
  return axisUnits.map((unit) => {
    const hint = unit === 'pixel'
      ? 'no wavelength: cannot be fitted'
      : unit !== 'nm' && (isWavelengthUnit(unit) || isFrequencyUnit(unit)) && from > 0 && to > 0
        ? wavelengthRange([from, to].map(x => pointToVacuumNanometre(x, unit, 'vacuum', 'ciddor1996')))
        : ''
    return { value: unit, label: unitNames[unit], hint }
  })
}

/** How far air moves a line in the middle of the axis; null for an axis without a medium. */
export function airShiftWords(from: number, to: number, unit: AxisUnit | null | undefined): string | null {
  if (!unit || !isWavelengthUnit(unit)) return null
  const middle = pointToVacuumNanometre((from + to) / 2, unit, 'vacuum', 'ciddor1996')
  return `At ${middle.toFixed(1)} nm the two differ by ${airShift(middle).toFixed(3)} nm.`
}
