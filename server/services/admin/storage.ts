import type { StorageView } from '#shared/schemas/admin'
import { database } from '../../database/client'
import { usageByCampaign } from '../../database/spectra/usage'
import { storage } from '../storage/index'

export async function readStorageUse(): Promise<StorageView> {
  const [rows, space] = await Promise.all([usageByCampaign(database()), storage().space()])
  const sum = (key: 'files' | 'bytes') => rows.reduce((total, row) => total + row[key], 0)
  return { space, files: sum('files'), bytes: sum('bytes'), campaigns: rows.map(({ archivedAt, ...row }) => ({ ...row, archived: archivedAt !== null })) }
}
