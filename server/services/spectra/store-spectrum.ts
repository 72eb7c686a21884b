import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { setImmediate as breathe } from 'node:timers/promises'
import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { storage } from '../storage/index'
import { describeBytes, fallbackOf } from './describe'
import { placeOf } from './place'
import { readingOf } from './reading'
import { storeOne, type Target } from './store-one'
import { refusedItem } from './upload-item'

export interface UploadedFile { name: string, path: string, sha256: string, notes: string[] }

/**
 * Files of one form into a campaign, one after the other; a file that cannot be read does not hold up the others, and is kept
 * for its owner to mend.
 */
export async function storeFiles(actor: Actor, slug: string, files: UploadedFile[], about: Partial<SpectrumAbout>): Promise<UploadItem[]> {
  const { campaign } = await campaignFor(actor, slug, 'upload')
  const target = { actor, campaignId: campaign.id, place: await placeOf(campaign.id, about), about }
  const items: UploadItem[] = []
  for (const file of files) {
    items.push(await storeFile(target, file))
    await breathe()
  }
  return items
}

async function storeFile(target: Target, { name, path, sha256, notes }: UploadedFile): Promise<UploadItem> {
  const bytes = await readFile(path)
  const description = await describeBytes(bytes, name, { about: target.about, fallback: fallbackOf(target.place.instrument) })
  // Of an empty file there is nothing to keep.
  if (!description.ok && bytes.length === 0) return refusedItem(name, description.error)
  const keep = () => storage().putFromFile(target.campaignId, sha256, path)
  return storeOne(target, { name, byteCount: bytes.length, sha256, notes, keep }, readingOf(description, target.about))
}

/** One spectrum as a JSON body, kept as it came. One that cannot be read is not kept: a script still has it. */
export async function storeJson(actor: Actor, slug: string, bytes: Buffer): Promise<UploadItem[]> {
  const { campaign } = await campaignFor(actor, slug, 'upload')
  const first = await describeBytes(bytes, 'body', { about: {} })
  if (!first.ok && (first.error.code === 'json_syntax' || bytes.length === 0)) throw new DomainError('bad_request', `The body is not valid JSON. ${first.error.message}`)
  if (!first.ok) return [refusedItem('body', first.error)]
  const place = await placeOf(campaign.id, first.facts.about)
  const description = place.instrument ? await describeBytes(bytes, 'body', { about: {}, fallback: fallbackOf(place.instrument) }) : first
  if (!description.ok) return [refusedItem('body', description.error)]
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const keep = () => storage().put(campaign.id, sha256, bytes)
  return [await storeOne({ actor, campaignId: campaign.id, place, about: {} }, { name: first.facts.name ?? 'spectrum', byteCount: bytes.length, sha256, notes: [], keep }, readingOf(description, {}))]
}
