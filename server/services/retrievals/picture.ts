import type { PictureData } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { findShownResult } from '../../database/retrievals/read'
import { offLoop } from '../../threads/off-loop'
import type { Actor } from '../accounts/actor'
import { getLineList } from '../line-lists/index'
import { loadSpectrumBytes } from '../spectra/load-for-fit'
import { retrievalFor } from './access'

/** Spectrum and model for the page, drawn again from the stored measurement. */
export async function retrievalPicture(actor: Actor, id: string): Promise<PictureData> {
  const { retrieval } = await retrievalFor(actor, id)
  if (!retrieval.spectrumId) throw new DomainError('not_found', 'This retrieval came from a line table; it has no spectrum to draw.')
  const [stored, spectrum] = await Promise.all([findShownResult(database(), id), loadSpectrumBytes(retrieval.spectrumId)])
  const settings = stored?.settings ?? retrieval.settings
  const lineList = settings.lineList ? await getLineList(settings.lineList) : null
  const drawn = await offLoop('draw', { ...spectrum, settings, measurement: stored?.result?.spectrum?.measurement ?? null }, lineList)
  if (drawn.ok) return drawn.picture
  throw new DomainError(drawn.error.code === 'incomplete_spectrum' ? 'incomplete_spectrum' : 'unreadable_spectrum', drawn.error.message)
}
