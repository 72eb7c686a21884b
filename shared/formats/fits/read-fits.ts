import { checkAxis, checkPixelCount } from '../check-columns'
import { FormatError } from '../format-error'
import type { FormatReading } from '../format-reading'
import { readAxis } from './axis'
import type { FitsImage } from './find-image'
import { findImage } from './find-image'
import { mildly, textOf } from './header'
import { readObservation } from './observation'
import { readPixels } from './pixels'

/** A spectrum from a one-dimensional FITS image with a linear axis. Throws `FormatError`. */
export function readFits(bytes: Uint8Array): FormatReading {
  const image = findImage(bytes)
  const pixels = readPixels(bytes, image)
  const { axis, unit, medium, warnings } = readAxis(image)
  const observation = readObservation(image.header)
  if (!axis.every(Number.isFinite)) throw new FormatError('fits_axis', `The axis leaves the range of numbers: look at CRVAL${image.axisNumber}, CRPIX${image.axisNumber} and the step.`, `CRVAL${image.axisNumber}`)
  checkAxis(axis, row => `pixel ${row + 1}`)
  const defined = leaveOutUndefined(axis, pixels)
  checkPixelCount(defined.values.length)
  return {
    spectrum: {
      format: 'fits',
      axis: defined.axis,
      values: defined.values,
      sigma: null,
      stated: { ...observation.stated, ...(unit ? { axisUnit: unit } : {}), ...(medium ? { medium } : {}) },
      columnNames: [],
      warnings: [...warnings, ...defined.warnings, ...observation.warnings, ...(unit && medium ? [] : hints(image)), ...(image.more ? ['The file has further extensions, which were not read.'] : [])],
    },
    proposedColumns: null,
  }
}

function leaveOutUndefined(axis: Float64Array, values: Float64Array) {
  const infinite = values.findIndex(value => Math.abs(value) === Infinity)
  if (infinite >= 0) throw new FormatError('not_finite', `Pixel ${infinite + 1} is infinite. Set it to NaN (undefined) and it is left out.`, `pixel ${infinite + 1}`)
  const first = values.findIndex(Number.isNaN)
  if (first < 0) return { axis, values, warnings: [] }
  const count = values.reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0)
  return {
    axis: axis.filter((_, index) => !Number.isNaN(values[index])),
    values: values.filter(value => !Number.isNaN(value)),
    warnings: [`${count} undefined ${count === 1 ? 'pixel was' : 'pixels were'} left out (the first is pixel ${first + 1}).`],
  }
}

/** Words of the header that are no statement by the standard, but help the person who is asked. */
function hints(image: FitsImage): string[] {
  const n = image.axisNumber
  const wat = mildly(() => textOf(image.header, `WAT${n}_001`), [])
  const comment = image.header.comments.get(`CRVAL${n}`)
  return [...(wat ? [`The header notes WAT${n}_001 = "${wat}"; confirm the unit.`] : []), ...(comment ? [`The header remarks on CRVAL${n}: "${comment}".`] : [])]
}
