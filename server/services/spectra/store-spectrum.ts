import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { setImmediate as breathe } from 'node:timers/promises'
import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { config } from '../../config'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import { findSpectrumBySha, insertSpectrum, updateSpectrumAbout, type SpectrumRow } from '../../database/spectra/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { storage } from '../storage/index'
import { placeOf, type Place } from './place'
import { readUpload } from './read-upload'
import { wavelengthRange } from './wavelength-range'

interface Target { actor: Actor, campaignId: string, place: Place, about: Partial<SpectrumAbout> }
interface Incoming { name: string, bytes: Uint8Array, sha256: string, keep: () => Promise<unknown> }

/** Files of one form into a campaign, one after the other; a file that cannot be read does not hold up the others. */
export async function storeFiles(actor: Actor, slug: string, files: { name: string, path: string, sha256: string }[], about: Partial<SpectrumAbout>): Promise<UploadItem[]> {
  const { campaign } = await campaignFor(actor, slug, 'upload')
  const target = { actor, campaignId: campaign.id, place: await placeOf(campaign.id, about), about }
  const items: UploadItem[] = []
  for (const { name, path, sha256 } of files) {
    const bytes = await readFile(path)
    items.push(await storeOne(target, { name, bytes, sha256, keep: () => storage().putFromFile(campaign.id, sha256, path) }))
    // A thousand pixels take a millisecond, a million half a second: others get their turn in between.
    await breathe()
  }
  return items
}

/** One spectrum as a JSON body. */
export async function storeJson(actor: Actor, slug: string, body: unknown): Promise<UploadItem[]> {
  const { campaign } = await campaignFor(actor, slug, 'upload')
  const bytes = Buffer.from(JSON.stringify(body))
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const { name, station, instrument } = body as Record<string, unknown>
  const text = (value: unknown) => typeof value === 'string' ? value : null
  const target = { actor, campaignId: campaign.id, place: await placeOf(campaign.id, { station: text(station), instrument: text(instrument) }), about: {} }
  return [await storeOne(target, { name: text(name)?.trim().slice(0, 200) || 'spectrum', bytes, sha256, keep: () => storage().put(campaign.id, sha256, bytes) })]
}

async function storeOne(target: Target, file: Incoming): Promise<UploadItem> {
  const outcome = readUpload(file.bytes, file.name, target.about, target.place.instrument)
  if (!outcome.ok) return { name: file.name, ok: false, missing: [], warnings: [], error: outcome.error }
  const { spectrum, about, missing } = outcome
  const most = config().limits.pixels
  if (spectrum.axis.length > most) return { name: file.name, ok: false, missing: [], warnings: [], error: { code: 'too_many_pixels', message: `A spectrum takes at most ${most} pixels here; this one has ${spectrum.axis.length}. Cut it to the range of the lines, or bin it.` } }
  const known = await findSpectrumBySha(database(), target.campaignId, file.sha256)
  if (known) return asKnown(target, file, known, { about, missing, ...wavelengthRange(spectrum, about) })
  await file.keep()
  const row: SpectrumRow = {
    id: newId(), campaignId: target.campaignId, ownerId: target.actor.userId, stationId: target.place.stationId, instrumentId: target.place.instrument?.id ?? null,
    name: file.name, sha256: file.sha256, byteCount: file.bytes.length, format: spectrum.format, pixelCount: spectrum.axis.length,
    ...wavelengthRange(spectrum, about), about, missing, warnings: spectrum.warnings,
    observedAt: about.observedAt ? new Date(about.observedAt) : null, createdAt: new Date(), version: 1,
  }
  try {
    await database().transaction(async (tx) => {
      await insertSpectrum(tx, row)
      await writeLogbook(tx, { campaignId: row.campaignId, objectKind: 'spectrum', objectId: row.id, actorId: row.ownerId, action: 'upload', detail: { name: row.name, sha256: row.sha256 } })
    })
  }
  catch (error) {
    // Somebody else stored the same bytes a moment ago.
    const winner = isDuplicateEntry(error) ? await findSpectrumBySha(database(), target.campaignId, file.sha256) : undefined
    if (!winner) throw error
    return asKnown(target, file, winner, { about, missing, ...wavelengthRange(spectrum, about) })
  }
  return itemOf(file.name, row, row.warnings)
}

type Reading = Pick<SpectrumRow, 'about' | 'missing' | 'wavelengthFrom' | 'wavelengthTo'>

/** The same bytes are the same spectrum. Answers that were still missing are taken over; others stay as they were. */
async function asKnown({ actor }: Target, file: Incoming, known: SpectrumRow, reading: Reading): Promise<UploadItem> {
  const answersMore = reading.missing.length < known.missing.length
  if (answersMore) {
    await database().transaction(async (tx) => {
      if (!await updateSpectrumAbout(tx, known, reading)) return
      await writeLogbook(tx, { campaignId: known.campaignId, objectKind: 'spectrum', objectId: known.id, actorId: actor.userId, action: 'complete', detail: { from: known.about, to: reading.about } })
    })
  }
  const row = answersMore ? { ...known, ...reading } : known
  return itemOf(file.name, row, [`The campaign holds these bytes already, as "${known.name}": this is the same spectrum.`, ...row.warnings])
}

const itemOf = (name: string, { id, format, pixelCount, about, missing }: SpectrumRow, warnings: string[]): UploadItem =>
  ({ name, ok: true, id, understood: { format, pixelCount, about }, missing, warnings })
