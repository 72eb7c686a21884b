import { DomainError } from '../../../shared/utils/domain-error'

const full = ['ENOSPC', 'EDQUOT', 'EFBIG']

/** A full disk in our own words; every other fault stays what it is. */
export function asStorageError(error: unknown): unknown {
  const code = (error as NodeJS.ErrnoException | null)?.code ?? ''
  if (full.includes(code)) return new DomainError('storage_full', 'The storage is full. Nothing was kept; try again later or tell the administrator.')
  if (code === 'ENOENT') return new DomainError('not_found', 'The stored file is not there.')
  return error
}

export async function withStorageErrors<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  }
  catch (error) {
    throw asStorageError(error)
  }
}
