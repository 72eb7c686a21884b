import type { LineMeasurementSet, ModelLine, SpectrumRetrievalInput } from '../types'
import { solveAt } from './fit'
import { merged } from './grouping'
import { drawPicture, type Picture } from './picture'
import { integratedBelow, restoreProblem } from './problem'

/** The lines that the stored areas belong to; null when the input no longer has one of them. */
function measuredGroups(lines: readonly ModelLine[], labels: readonly string[]): ModelLine[] | null {
  const byLabel = new Map(lines.map(line => [line.label, line]))
  const groups = labels.map((label): ModelLine | null => {
    const whole = byLabel.get(label)
    if (whole) return whole
    const parts = label.split(' + ').map(part => byLabel.get(part))
    const found = parts.filter(part => part !== undefined)
    return found.length === parts.length ? found.reduce(merged) : null
  })
  return groups.some(group => group === null) ? null : groups.filter(group => group !== null)
}

/**
 * Draws a stored measurement over its spectrum again: same pixels, same lines and groups, shift (nm) and FWHM (nm) as stored. Areas and
 * continuum follow by one linear solution, so nothing is fitted and the model is the stored one to rounding.
 * @returns null when the measurement does not belong to this input, or is no fit
 */
export function redrawPicture(given: SpectrumRetrievalInput, measurement: LineMeasurementSet): Picture | null {
  const input = given.noise === 'from-residuals' ? { ...given, spectrum: { ...given.spectrum, sigma: null } } : given
  const { labels, shift, fwhm, pixelRange: [first, last] } = measurement
  const lines = measuredGroups(input.lines, labels)
  const { wavelength } = input.spectrum
  if (lines === null || lines.length === 0 || !(fwhm > 0) || !(last > first) || last >= wavelength.length) return null
  const pixel = (wavelength[last] - wavelength[first]) / (last - first)
  const problem = restoreProblem(input, lines, [wavelength[first], wavelength[last]], fwhm < integratedBelow * pixel)
  return solveAt(problem.system, { shift, logWidth: Math.log(fwhm) }) ? drawPicture(input.spectrum, problem) : null
}
