import type { Readable } from 'node:stream'
import { pageOf } from '#shared/schemas/paging'
import type { SpectraQuery, SpectrumData, SpectrumPatch, SpectrumView } from '#shared/schemas/spectrum-view'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { countSpectra, findSpectra, updateSpectrum } from '../../database/spectra/repository'
import { writeLogbook } from '../../database/logbook/repository'
import { offLoop } from '../../threads/off-loop'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { storage } from '../storage/index'
import { spectrumFor, spectrumToChange, spectrumView, staleSpectrum } from './access'
import { describeBytes, fallbackOf } from './describe'
import { placeOf } from './place'
import { readingOf } from './reading'

export async function listSpectra(actor: Actor, slug: string, query: SpectraQuery): Promise<Page<SpectrumView>> {
  const { campaign, role } = await campaignFor(actor, slug, 'see')
  const db = database()
  const wanted = { campaignId: campaign.id, problem: query.problem ?? null }
  const [rows, total] = await Promise.all([
    findSpectra(db, wanted, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countSpectra(db, wanted),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.id, view: spectrum => spectrumView(actor, { spectrum, campaign: slug, role }) })
}

export const getSpectrum = async (actor: Actor, id: string): Promise<SpectrumView> => spectrumView(actor, await spectrumFor(actor, id, 'see'))

/** Thinned for a plot, in the unit and the order of the file. */
export async function spectrumData(actor: Actor, id: string, points: number): Promise<SpectrumData> {
  const { spectrum: { campaignId, sha256, name, about } } = await spectrumFor(actor, id, 'see')
  const thinned = await offLoop('thin', { bytes: await storage().read(campaignId, sha256), name, about, points })
  if (!thinned.ok) throw new DomainError('unreadable_spectrum', thinned.error.message)
  return { axis: thinned.axis, values: thinned.values, axisUnit: about.axisUnit, medium: about.medium }
}

/** The bytes as they were uploaded. */
export async function spectrumBytes(actor: Actor, id: string): Promise<{ name: string, stream: Readable, bytes: number }> {
  const { spectrum } = await spectrumFor(actor, id, 'export')
  return { name: spectrum.name, ...await storage().open(spectrum.campaignId, spectrum.sha256) }
}

/** Says more, or something else, about a spectrum. Finished results keep theirs. A file that could not be read may be readable then. */
export async function amendSpectrum(actor: Actor, id: string, { version, about: said }: SpectrumPatch): Promise<SpectrumView> {
  const access = await spectrumToChange(actor, { id, version })
  const { spectrum } = access
  const place = await placeOf(spectrum.campaignId, said, { keeps: spectrum })
  const about = { ...spectrum.about, ...said }
  const bytes = await storage().read(spectrum.campaignId, spectrum.sha256)
  const description = await describeBytes(bytes, spectrum.name, { about, fallback: fallbackOf(place.instrument) })
  if (!description.ok) throw new DomainError('unreadable_spectrum', description.error.message)
  const change = {
    ...readingOf(description, about), stationId: place.stationId ?? spectrum.stationId, instrumentId: place.instrument?.id ?? spectrum.instrumentId,
  }
  await database().transaction(async (tx) => {
    if (!await updateSpectrum(tx, { id, version }, change)) throw staleSpectrum(actor, access)
    await writeLogbook(tx, { campaignId: spectrum.campaignId, objectKind: 'spectrum', objectId: id, actorId: actor.userId, action: 'amend', detail: { from: spectrum.about, to: change.about } })
  })
  return getSpectrum(actor, id)
}
