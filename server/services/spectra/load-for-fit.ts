import type { SpectrumAbout } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { findSpectrumById } from '../../database/spectra/repository'
import { storage } from '../storage/index'

/** The original bytes with what is known of them. */
export async function loadSpectrumBytes(spectrumId: string): Promise<{ bytes: Uint8Array, name: string, about: SpectrumAbout, sha256: string }> {
  const found = await findSpectrumById(database(), spectrumId)
  if (!found) throw new DomainError('not_found', 'There is no such spectrum.')
  const { campaignId, name, about, sha256 } = found.spectrum
  return { bytes: await storage().read(campaignId, sha256), name, about, sha256 }
}
