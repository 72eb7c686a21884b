import type { AxisMedium, AxisUnit } from '../../types/spectrum'
import { FormatError } from '../format-error'
import { axisUnitOf } from '../units'
import type { FitsImage } from './find-image'
import { numberOf, textOf } from './header'

export interface FitsAxis { axis: Float64Array, unit: AxisUnit | null, medium: AxisMedium | null, warnings: string[] }

/** Axis types of the standard (Greisen et al. 2006, A&A 446, 747, table 1) that a spectrum here can have. */
const media: Record<string, AxisMedium> = { WAVE: 'vacuum', AWAV: 'air', FREQ: 'vacuum', WAVN: 'vacuum' }
const otherQuantities = ['ENER', 'VRAD', 'VOPT', 'ZOPT', 'VELO', 'BETA', 'FELO']
/** SI units that FITS prefers, and what they are read as. */
const converted: Record<string, { unit: AxisUnit, factor: number }> = { 'm': { unit: 'nm', factor: 1e9 }, 'm-1': { unit: 'cm-1', factor: 1e-2 }, '1/m': { unit: 'cm-1', factor: 1e-2 } }

/** The linear axis CRVAL + (pixel - CRPIX) * CDELT, pixels counted from 1. */
export function readAxis(image: FitsImage): FitsAxis {
  const n = image.axisNumber
  refuseNonLinear(image)
  const reference = required(image, `CRVAL${n}`)
  const pixel = required(image, `CRPIX${n}`)
  const { step, warnings } = stepOf(image)
  const cunit = textOf(image.header, `CUNIT${n}`)
  const conversion = cunit ? converted[cunit] : undefined
  const factor = conversion?.factor ?? 1
  const axis = Float64Array.from({ length: image.length }, (_, i) => factor * (reference + (i + 1 - pixel) * step))
  const unit = conversion?.unit ?? (cunit ? axisUnitOf(cunit) : null)
  if (conversion) warnings.push(`The axis was converted from ${cunit} to ${conversion.unit}.`)
  else if (cunit && !unit) warnings.push(`CUNIT${n} = "${cunit}" is not a unit that is read here.`)
  return { axis, unit, medium: media[axisType(image)] ?? null, warnings }
}

const axisType = (image: FitsImage) => (textOf(image.header, `CTYPE${image.axisNumber}`) ?? '').toUpperCase()

function refuseNonLinear(image: FitsImage): void {
  const type = axisType(image)
  const keyword = `CTYPE${image.axisNumber}`
  if (otherQuantities.includes(type.slice(0, 4))) throw new FormatError('fits_axis', `${keyword} = "${type}" is not a wavelength, wavenumber or frequency axis. Convert the axis first.`, keyword)
  if (/^(WAVE|AWAV|FREQ|WAVN)-/.test(type) || type.startsWith('MULTISPE')) throw new FormatError('fits_axis', `${keyword} = "${type}" is not a linear axis. Resample the spectrum to a linear axis, or export axis and values as text.`, keyword)
  if (numberOf(image.header, 'DC-FLAG') === 1) throw new FormatError('fits_axis', 'DC-FLAG = 1 says that the axis is logarithmic. Resample the spectrum to a linear axis, or export axis and values as text.', 'DC-FLAG')
}

function required(image: FitsImage, keyword: string): number {
  const value = numberOf(image.header, keyword)
  if (value === null) throw new FormatError('fits_axis', `The FITS header lacks ${keyword}, so that the axis is not known. Add it, or export axis and values as text.`, keyword)
  return value
}

function stepOf(image: FitsImage): { step: number, warnings: string[] } {
  const n = image.axisNumber
  const matrix = numberOf(image.header, `CD${n}_${n}`)
  const increment = numberOf(image.header, `CDELT${n}`)
  if (matrix === null && increment === null) throw new FormatError('fits_axis', `The FITS header lacks both CDELT${n} and CD${n}_${n}, so that the axis is not known. Add one, or export axis and values as text.`, `CDELT${n}`)
  const step = matrix ?? increment! * (numberOf(image.header, `PC${n}_${n}`) ?? 1)
  if (step === 0) throw new FormatError('fits_axis', `The step of the axis (CDELT${n} or CD${n}_${n}) is zero.`, `CDELT${n}`)
  const disagree = matrix !== null && increment !== null && Math.abs(matrix - increment) > 1e-9 * Math.abs(matrix)
  return { step, warnings: disagree ? [`CD${n}_${n} = ${matrix} and CDELT${n} = ${increment} disagree; CD${n}_${n} was taken, as the standard asks.`] : [] }
}
