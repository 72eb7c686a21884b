import { normaliseSpectrum } from '#shared/engine/units/normalise'
import type { SpectrumInput } from '#shared/engine/types'
import { readSpectrum } from '#shared/formats/read-spectrum'
import type { ReadSpectrum, SpectrumAbout } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { findSpectrumById, type SpectrumRow } from '../../database/spectra/repository'
import { storage } from '../storage/index'

export type SpectrumForFit = SpectrumInput & { about: SpectrumAbout, sha256: string }

/** The numbers of the original bytes, read as the row says. */
export async function readStored(row: SpectrumRow): Promise<ReadSpectrum> {
  const outcome = readSpectrum(await storage().read(row.campaignId, row.sha256), row.name, row.about)
  if (!outcome.ok) throw new DomainError('unreadable_spectrum', outcome.error.message)
  return outcome.spectrum
}

/** The original bytes with what is known of them. */
export async function loadSpectrumBytes(spectrumId: string): Promise<{ bytes: Uint8Array, name: string, about: SpectrumAbout, sha256: string }> {
  const found = await findSpectrumById(database(), spectrumId)
  if (!found) throw new DomainError('not_found', 'There is no such spectrum.')
  const { campaignId, name, about, sha256 } = found.spectrum
  return { bytes: await storage().read(campaignId, sha256), name, about, sha256 }
}

/** On rising vacuum nm, as the engine takes it. Throws `incomplete_spectrum` while unit or medium are not known. */
export async function loadSpectrumForFit(spectrumId: string): Promise<SpectrumForFit> {
  const found = await findSpectrumById(database(), spectrumId)
  if (!found) throw new DomainError('not_found', 'There is no such spectrum.')
  const { about, sha256 } = found.spectrum
  const raw = await readStored(found.spectrum)
  const normal = normaliseSpectrum(raw, { unit: about.axisUnit, medium: about.medium, airFormula: about.airFormula })
  if ('problem' in normal) throw new DomainError('incomplete_spectrum', normal.problem)
  return { ...normal, ...(about.fullScale === null ? {} : { fullScale: about.fullScale }), about, sha256 }
}
