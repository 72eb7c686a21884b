import type { SpectrumView } from '#shared/schemas/spectrum-view'
import type { CampaignAction, CampaignRole } from '#shared/types/roles'
import { DomainError } from '#shared/utils/domain-error'
import { may } from '#shared/utils/permissions'
import { database } from '../../database/client'
import { findSpectrumById, type SpectrumRow } from '../../database/spectra/repository'
import type { Actor } from '../accounts/actor'
import { campaignByIdFor } from '../campaigns/access'

export interface SpectrumAccess { spectrum: SpectrumRow, campaign: string, role: CampaignRole }

/** The row, for whoever may do this in its campaign. Somebody else's is not found. */
export async function spectrumFor(actor: Actor, id: string, action: CampaignAction): Promise<SpectrumAccess> {
  const found = await findSpectrumById(database(), id)
  const nothing = new DomainError('not_found', 'There is no such spectrum, or it is of a campaign that you are no member of.')
  if (!found) throw nothing
  const { role } = await campaignByIdFor(actor, found.spectrum.campaignId, action).catch((error: unknown) => {
    throw error instanceof DomainError && error.code === 'not_found' ? nothing : error
  })
  return { ...found, role }
}

/** The row at the version that the caller has read: one's own, or anyone's for those who may revise. */
export async function spectrumToChange(actor: Actor, { id, version }: { id: string, version: number }): Promise<SpectrumAccess> {
  const access = await spectrumFor(actor, id, 'upload')
  if (access.spectrum.ownerId !== actor.userId) await campaignByIdFor(actor, access.spectrum.campaignId, 'revise-any')
  if (access.spectrum.version !== version) throw staleSpectrum(actor, access)
  return access
}

export function spectrumView(actor: Actor, { spectrum, campaign, role }: SpectrumAccess): SpectrumView {
  const { ownerId, campaignId: _, stationId: __, instrumentId: ___, observedAt, createdAt, ...row } = spectrum
  const mayMend = actor.scope === 'submit' && may(role, ownerId === actor.userId ? 'upload' : 'revise-any')
  return { ...row, campaign, mayMend, observedAt: observedAt?.toISOString() ?? null, createdAt: createdAt.toISOString() }
}

export const staleSpectrum = (actor: Actor, access: SpectrumAccess) =>
  new DomainError('stale_version', 'Somebody changed this spectrum meanwhile. Look at it as it is now and decide again.', undefined, spectrumView(actor, access))
