import type { Readable } from 'node:stream'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { SpectrumData, SpectrumPatch, SpectrumView } from '#shared/schemas/spectrum-view'
import type { CampaignAction } from '#shared/types/roles'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { countSpectra, findSpectra, findSpectrumById, updateSpectrumAbout, type SpectrumRow } from '../../database/spectra/repository'
import type { Actor } from '../accounts/actor'
import { campaignByIdFor, campaignFor } from '../campaigns/access'
import { storage } from '../storage/index'
import { readStored } from './load-for-fit'
import { placeOf } from './place'
import { readUpload } from './read-upload'
import { thinnedPixels } from './thin'
import { wavelengthRange } from './wavelength-range'

const spectrumView = ({ ownerId: _, campaignId: __, stationId: ___, instrumentId: ____, observedAt, createdAt, ...row }: SpectrumRow, campaign: string): SpectrumView =>
  ({ ...row, campaign, observedAt: observedAt?.toISOString() ?? null, createdAt: createdAt.toISOString() })

export async function listSpectra(actor: Actor, slug: string, query: PageQuery): Promise<Page<SpectrumView>> {
  const { campaign } = await campaignFor(actor, slug, 'see')
  const db = database()
  const [rows, total] = await Promise.all([
    findSpectra(db, campaign.id, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countSpectra(db, campaign.id),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.id, view: row => spectrumView(row, slug) })
}

/** The row, for whoever may do this in its campaign. Somebody else's is not found. */
async function spectrumFor(actor: Actor, id: string, action: CampaignAction) {
  const found = await findSpectrumById(database(), id)
  const nothing = new DomainError('not_found', 'There is no such spectrum, or it is of a campaign that you are no member of.')
  if (!found) throw nothing
  const { role } = await campaignByIdFor(actor, found.spectrum.campaignId, action).catch((error: unknown) => {
    throw error instanceof DomainError && error.code === 'not_found' ? nothing : error
  })
  return { ...found, role }
}

export async function getSpectrum(actor: Actor, id: string): Promise<SpectrumView> {
  const { spectrum, campaign } = await spectrumFor(actor, id, 'see')
  return spectrumView(spectrum, campaign)
}

/** Thinned for a plot, in the unit and the order of the file. */
export async function spectrumData(actor: Actor, id: string, points: number): Promise<SpectrumData> {
  const { spectrum } = await spectrumFor(actor, id, 'see')
  const { axis, values } = await readStored(spectrum)
  const pixels = thinnedPixels(values, points).filter(i => Number.isFinite(values[i]))
  return { axis: pixels.map(i => axis[i]!), values: pixels.map(i => values[i]!), axisUnit: spectrum.about.axisUnit, medium: spectrum.about.medium }
}

/** The bytes as they were uploaded. */
export async function spectrumBytes(actor: Actor, id: string): Promise<{ name: string, stream: Readable, bytes: number }> {
  const { spectrum } = await spectrumFor(actor, id, 'export')
  return { name: spectrum.name, ...await storage().open(spectrum.campaignId, spectrum.sha256) }
}

/** Says more, or something else, about a spectrum: one's own, or anyone's for those who may revise. Finished results keep theirs. */
export async function amendSpectrum(actor: Actor, id: string, { version, about: said }: SpectrumPatch): Promise<SpectrumView> {
  const { spectrum, campaign } = await spectrumFor(actor, id, 'upload')
  if (spectrum.ownerId !== actor.userId) await campaignByIdFor(actor, spectrum.campaignId, 'revise-any')
  if (spectrum.version !== version) throw stale(spectrum, campaign)
  const place = await placeOf(spectrum.campaignId, said)
  const bytes = await storage().read(spectrum.campaignId, spectrum.sha256)
  const outcome = readUpload(bytes, spectrum.name, { ...spectrum.about, ...said }, place.instrument)
  if (!outcome.ok) throw new DomainError('unreadable_spectrum', outcome.error.message)
  const { about, missing } = outcome
  const change = {
    about, missing, ...wavelengthRange(outcome.spectrum, about), pixelCount: outcome.spectrum.axis.length,
    observedAt: about.observedAt ? new Date(about.observedAt) : null,
    stationId: place.stationId ?? spectrum.stationId, instrumentId: place.instrument?.id ?? spectrum.instrumentId,
  }
  await database().transaction(async (tx) => {
    if (!await updateSpectrumAbout(tx, { id, version }, change)) throw stale(spectrum, campaign)
    await writeLogbook(tx, { campaignId: spectrum.campaignId, objectKind: 'spectrum', objectId: id, actorId: actor.userId, action: 'amend', detail: { from: spectrum.about, to: about } })
  })
  return getSpectrum(actor, id)
}

const stale = (row: SpectrumRow, campaign: string) =>
  new DomainError('stale_version', 'Somebody changed this spectrum meanwhile. Look at it as it is now and decide again.', undefined, spectrumView(row, campaign))
