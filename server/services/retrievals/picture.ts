import { redrawPicture } from '#shared/engine/spectrum/redraw'
import type { PictureData } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { prepareFromSpectrum } from '#shared/utils/retrieval/from-spectrum'
import { database } from '../../database/client'
import { findShownResult } from '../../database/retrievals/read'
import type { Actor } from '../accounts/actor'
import { getLineList } from '../line-lists/index'
import { loadSpectrumForFit } from '../spectra/load-for-fit'
import { retrievalFor } from './access'

const mostPointsWithoutFit = 4000

/**
 * Spectrum and model for the page. Nothing is fitted: shift and width are those of the stored measurement, and the areas
 * follow from them by one linear solution.
 */
export async function retrievalPicture(actor: Actor, id: string): Promise<PictureData> {
  const { retrieval } = await retrievalFor(actor, id)
  if (!retrieval.spectrumId) throw new DomainError('not_found', 'This retrieval came from a line table; it has no spectrum to draw.')
  const [stored, spectrum] = await Promise.all([findShownResult(database(), id), loadSpectrumForFit(retrieval.spectrumId)])
  const settings = stored?.settings ?? retrieval.settings
  const lineList = settings.lineList ? await getLineList(settings.lineList) : null
  const prepared = prepareFromSpectrum({ spectrum, settings, lineList })
  const measurement = stored?.result?.spectrum?.measurement
  if ('problem' in prepared || !measurement || measurement.areas.length === 0) return spectrumOnly(spectrum)
  return redrawPicture(prepared.input, measurement) ?? spectrumOnly(spectrum)
}

/** Where there is no fit to draw. */
function spectrumOnly({ wavelength, values }: { wavelength: ArrayLike<number>, values: ArrayLike<number> }): PictureData {
  const stride = Math.max(1, Math.ceil(wavelength.length / mostPointsWithoutFit))
  const shown = Array.from({ length: Math.ceil(wavelength.length / stride) }, (_, i) => i * stride).filter(i => Number.isFinite(values[i]))
  const nothing = shown.map(() => null)
  return { wavelength: shown.map(i => wavelength[i]!), values: shown.map(i => values[i]!), model: nothing, continuum: nothing }
}
