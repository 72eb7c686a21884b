import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import { findSpectrumBySha, insertSpectrum, type SpectrumRow } from '../../database/spectra/repository'
import type { Actor } from '../accounts/actor'
import { itemOf, keptWords } from './upload-item'
import { sameBytes } from './same-bytes'
import type { Place } from './place'
import type { Reading } from './reading'

export interface Target { actor: Actor, campaignId: string, place: Place, about: Partial<SpectrumAbout> }
/** `keep` puts the bytes into the storage. */
export interface Incoming { name: string, byteCount: number, sha256: string, notes: string[], keep: () => Promise<unknown> }

/** One file that was looked at into the campaign: a new row, or the one that has the same bytes. */
export async function storeOne(target: Target, file: Incoming, reading: Reading): Promise<UploadItem> {
  const known = await findSpectrumBySha(database(), target.campaignId, file.sha256)
  if (known) return sameBytes(target.actor, file, known, reading)
  const row: SpectrumRow = {
    ...reading, id: newId(), campaignId: target.campaignId, ownerId: target.actor.userId, stationId: target.place.stationId, instrumentId: target.place.instrument?.id ?? null,
    name: file.name, sha256: file.sha256, byteCount: file.byteCount, createdAt: new Date(), version: 1,
  }
  try {
    await insertWithBytes(row, file)
  }
  catch (error) {
    // Somebody else stored the same bytes a moment ago.
    const winner = isDuplicateEntry(error) ? await findSpectrumBySha(database(), target.campaignId, file.sha256) : undefined
    if (!winner) throw error
    return sameBytes(target.actor, file, winner, reading)
  }
  return itemOf(file.name, row, [...file.notes, ...(row.problem ? [keptWords] : row.warnings)])
}

/** The bytes are put down while the row is held, so that nobody who deletes the same bytes can take them away in between. */
const insertWithBytes = (row: SpectrumRow, { keep }: Incoming) => database().transaction(async (tx) => {
  await insertSpectrum(tx, row)
  await keep()
  await writeLogbook(tx, {
    campaignId: row.campaignId, objectKind: 'spectrum', objectId: row.id, actorId: row.ownerId, action: 'upload',
    detail: { name: row.name, sha256: row.sha256, ...(row.problem ? { problem: row.problem.code } : {}) },
  })
})
