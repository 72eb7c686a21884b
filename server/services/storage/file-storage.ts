import { randomUUID } from 'node:crypto'
import { copyFile, mkdir, open, readFile, rename, rm, stat, statfs, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import type { Storage } from './storage'
import { withStorageErrors } from './storage-error'

/** Storage in a folder of the file system. An object appears under its name only when it is complete and on the disk. */
export function createFileStorage(folder: string): Storage {
  const pathOf = (campaignId: string, sha256: string) => objectPath(folder, campaignId, sha256)

  return {
    putFromFile: (campaignId, sha256, temporaryPath) => withStorageErrors(async () => {
      const target = pathOf(campaignId, sha256)
      if (await isFile(target)) {
        await rm(temporaryPath, { force: true })
        return { existed: true }
      }
      await place(target, part => moveFile(temporaryPath, part))
      return { existed: false }
    }),
    put: (campaignId, sha256, bytes) => withStorageErrors(async () => {
      const target = pathOf(campaignId, sha256)
      if (await isFile(target)) return { existed: true }
      await place(target, part => writeFile(part, bytes))
      return { existed: false }
    }),
    open: (campaignId, sha256) => withStorageErrors(async () => {
      const handle = await open(pathOf(campaignId, sha256))
      return { stream: handle.createReadStream(), bytes: (await handle.stat()).size }
    }),
    read: (campaignId, sha256) => withStorageErrors(() => readFile(pathOf(campaignId, sha256))),
    exists: async (campaignId, sha256) => isFile(pathOf(campaignId, sha256)),
    remove: (campaignId, sha256) => withStorageErrors(() => rm(pathOf(campaignId, sha256), { force: true })),
    check: () => withStorageErrors(async () => {
      const probe = join(folder, `.probe-${randomUUID()}`)
      await mkdir(folder, { recursive: true })
      await writeFile(probe, 'ready').finally(() => rm(probe, { force: true }))
    }),
    // What others than root may fill.
    space: () => statfs(folder).then(({ bavail, blocks, bsize }) => ({ free: bavail * bsize, total: blocks * bsize }), () => null),
  }
}

/** Both names come from our own database, and are checked all the same: no path leaves the folder. */
function objectPath(folder: string, campaignId: string, sha256: string): string {
  if (!/^[A-Za-z0-9_-]{1,64}$/.test(campaignId) || !/^[0-9a-f]{64}$/.test(sha256)) throw new RangeError('Not a name of a stored object.')
  return join(folder, campaignId, sha256.slice(0, 2), sha256)
}

async function isFile(path: string): Promise<boolean> {
  return stat(path).then(found => found.isFile(), () => false)
}

/** Writes beside the target, forces the bytes to the disk, then renames: readers see all or nothing. */
async function place(target: string, write: (part: string) => Promise<void>): Promise<void> {
  await mkdir(dirname(target), { recursive: true })
  const part = `${target}.${randomUUID()}.part`
  try {
    await write(part)
    await flush(part)
    await rename(part, target)
  }
  finally {
    await rm(part, { force: true })
  }
}

async function flush(path: string): Promise<void> {
  const handle = await open(path, 'r+')
  await handle.sync().finally(() => handle.close())
}

/** A rename, or a copy where the temporary folder is on another file system. */
async function moveFile(from: string, to: string): Promise<void> {
  try {
    await rename(from, to)
  }
  catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EXDEV') throw error
    await copyFile(from, to)
    await rm(from, { force: true })
  }
}
