import { readFile } from 'node:fs/promises'
import type { SpectrumView } from '#shared/schemas/spectrum-view'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { database, type Transaction } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { writeLogbook } from '../../database/logbook/repository'
import { countRetrievalsOf, deleteUnreadable, findSpectrumBySha, lockSpectrumBytes, updateSpectrum, type SpectrumRow } from '../../database/spectra/repository'
import type { Actor } from '../accounts/actor'
import { storage } from '../storage/index'
import { spectrumToChange, staleSpectrum, type SpectrumAccess } from './access'
import { describeBytes, fallbackOf } from './describe'
import { getSpectrum } from './index'
import { placeOf } from './place'
import { readingOf } from './reading'
import type { UploadedFile } from './store-spectrum'

interface Target { id: string, version: number }

/** Puts a mended file in the place of one that could not be read; what was said of the old one goes on to hold. */
export async function replaceSpectrumBytes(actor: Actor, target: Target, file: UploadedFile, said: Partial<SpectrumAbout>): Promise<SpectrumView> {
  const access = await spectrumToChange(actor, target)
  const { spectrum } = access
  refuseReadable(spectrum)
  const place = await placeOf(spectrum.campaignId, said, { keeps: spectrum })
  const bytes = await readFile(file.path)
  const about = { ...spectrum.about, ...said }
  const description = await describeBytes(bytes, file.name, { about, fallback: fallbackOf(place.instrument) })
  if (!description.ok) throw new DomainError('unreadable_spectrum', `"${file.name}" cannot be read either, so the file before it was left in place. ${description.error.message}`, [{ path: 'files', message: description.error.message }])
  const change = {
    ...readingOf(description, about), name: file.name, sha256: file.sha256, byteCount: bytes.length,
    stationId: place.stationId ?? spectrum.stationId, instrumentId: place.instrument?.id ?? spectrum.instrumentId,
  }
  await refuseKnownBytes(spectrum, file.sha256, () => database().transaction(async (tx) => {
    if (!await updateSpectrum(tx, target, change)) throw staleSpectrum(actor, access)
    await storage().putFromFile(spectrum.campaignId, file.sha256, file.path)
    await note(tx, actor, access, 'replace', { from: { name: spectrum.name, sha256: spectrum.sha256 }, to: { name: file.name, sha256: file.sha256 } })
  }))
  await releaseBytes(spectrum)
  return getSpectrum(actor, spectrum.id)
}

/** Takes a file that cannot be read out of the campaign, with its bytes. */
export async function deleteSpectrum(actor: Actor, target: Target): Promise<void> {
  const access = await spectrumToChange(actor, target)
  const { spectrum } = access
  refuseReadable(spectrum)
  await database().transaction(async (tx) => {
    const waiting = await countRetrievalsOf(tx, spectrum.id)
    if (waiting > 0) throw new DomainError('conflict', `${waiting === 1 ? 'A retrieval rests' : `${waiting} retrievals rest`} on this file. Replace it by a mended one instead.`)
    if (!await deleteUnreadable(tx, target)) throw staleSpectrum(actor, access)
    await note(tx, actor, access, 'delete', { name: spectrum.name, sha256: spectrum.sha256 })
  })
  await releaseBytes(spectrum)
}

function refuseReadable({ problem }: SpectrumRow): void {
  if (!problem) throw new DomainError('conflict', 'This spectrum can be read, and results may rest on its bytes: it is neither replaced nor deleted. Upload the other file as a spectrum of its own.')
}

async function refuseKnownBytes<T>({ campaignId }: SpectrumRow, sha256: string, store: () => Promise<T>): Promise<T> {
  try {
    return await store()
  }
  catch (error) {
    const known = isDuplicateEntry(error) ? await findSpectrumBySha(database(), campaignId, sha256) : undefined
    if (!known) throw error
    throw new DomainError('conflict', `The campaign holds the mended file already, as "${known.name}". Delete this one.`)
  }
}

/** Removes bytes that no row speaks of any more. Whoever uploads the same ones at this moment waits, and then puts them down again. */
const releaseBytes = ({ campaignId, sha256 }: SpectrumRow) => database().transaction(async (tx) => {
  if (!await lockSpectrumBytes(tx, campaignId, sha256)) await storage().remove(campaignId, sha256)
})

const note = (tx: Transaction, actor: Actor, { spectrum }: SpectrumAccess, action: string, detail: Record<string, unknown>) =>
  writeLogbook(tx, { campaignId: spectrum.campaignId, objectKind: 'spectrum', objectId: spectrum.id, actorId: actor.userId, action, detail })
