import type { UploadItem } from '#shared/schemas/spectrum-view'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { updateSpectrum, type SpectrumRow } from '../../database/spectra/repository'
import type { Actor } from '../accounts/actor'
import type { Reading } from './reading'
import { itemOf } from './upload-item'

/** The same bytes are the same spectrum. Answers that were still missing are taken over; others stay as they were. */
export async function sameBytes(actor: Actor, file: { name: string, notes: string[] }, known: SpectrumRow, reading: Reading): Promise<UploadItem> {
  const row = saysMore(known, reading) ? await takeOver(actor, known, reading) : known
  const what = row.problem ? 'and they cannot be read: see what is wrong, and replace or delete that file' : 'this is the same spectrum'
  return itemOf(file.name, row, [...file.notes, `The campaign holds these bytes already, as "${known.name}": ${what}.`, ...row.warnings])
}

/** A reading that got further than the stored one: the file can be read now, or fewer questions are open. */
function saysMore(known: SpectrumRow, reading: Reading): boolean {
  if (reading.problem) return false
  return known.problem !== null || reading.missing.length < known.missing.length
}

async function takeOver(actor: Actor, known: SpectrumRow, reading: Reading): Promise<SpectrumRow> {
  const taken = await database().transaction(async (tx) => {
    if (!await updateSpectrum(tx, known, reading)) return false
    await writeLogbook(tx, { campaignId: known.campaignId, objectKind: 'spectrum', objectId: known.id, actorId: actor.userId, action: 'complete', detail: { from: known.about, to: reading.about } })
    return true
  })
  return taken ? { ...known, ...reading } : known
}
