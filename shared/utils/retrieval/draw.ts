import { redrawPicture } from '../../engine/spectrum/redraw'
import type { LineMeasurementSet } from '../../engine/types'
import { normaliseSpectrum } from '../../engine/units/normalise'
import type { RetrievalSettings } from '../../schemas/settings'
import type { LineList } from '../../types/line-list'
import type { PictureData } from '../../types/retrieval'
import type { ReadSpectrum, SpectrumAbout } from '../../types/spectrum'
import { prepareFromSpectrum } from './from-spectrum'

const mostPointsWithoutFit = 4000

interface Drawn { spectrum: ReadSpectrum, about: SpectrumAbout, settings: RetrievalSettings, lineList: LineList | null, measurement: LineMeasurementSet | null }

/**
 * Spectrum and model for the page. Nothing is fitted: shift and width are those of the stored measurement, and the areas
 * follow from them by one linear solution. A problem in words while the axis is not known.
 */
export function drawRetrieval({ spectrum, about, settings, lineList, measurement }: Drawn): PictureData | { problem: string } {
  const normal = normaliseSpectrum(spectrum, { unit: about.axisUnit, medium: about.medium, airFormula: about.airFormula })
  if ('problem' in normal) return normal
  const prepared = prepareFromSpectrum({ spectrum: { ...normal, about }, settings, lineList })
  if ('problem' in prepared || !measurement || measurement.areas.length === 0) return spectrumOnly(normal)
  return redrawPicture(prepared.input, measurement) ?? spectrumOnly(normal)
}

/** Where there is no fit to draw. */
function spectrumOnly({ wavelength, values }: { wavelength: ArrayLike<number>, values: ArrayLike<number> }): PictureData {
  const stride = Math.max(1, Math.ceil(wavelength.length / mostPointsWithoutFit))
  const shown = Array.from({ length: Math.ceil(wavelength.length / stride) }, (_, i) => i * stride).filter(i => Number.isFinite(values[i]))
  const nothing = shown.map(() => null)
  return { wavelength: shown.map(i => wavelength[i]!), values: shown.map(i => values[i]!), model: nothing, continuum: nothing }
}
