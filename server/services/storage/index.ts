import { config } from '../../config'
import { createFileStorage } from './file-storage'
import type { Storage } from './storage'

let current: Storage | undefined

/** The storage of this process. */
export const storage = (): Storage => (current ??= createFileStorage(config().storageDir))
