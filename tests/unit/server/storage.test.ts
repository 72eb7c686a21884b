import { createHash } from 'node:crypto'
import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { createFileStorage } from '../../../server/services/storage/file-storage'
import { withStorageErrors } from '../../../server/services/storage/storage-error'
import type { Storage } from '../../../server/services/storage/storage'

let folder: string
let storage: Storage
const text = '500,1\n501,2\n'
const sha = createHash('sha256').update(text).digest('hex')

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'storage-'))
  storage = createFileStorage(join(folder, 'objects'))
})
afterEach(() => rm(folder, { recursive: true }))

async function temporaryFile(): Promise<string> {
  const path = join(folder, 'incoming')
  await writeFile(path, text)
  return path
}

describe('storage in a folder', () => {
  it('moves a file in and gives the same bytes back, as a buffer and as a stream', async () => {
    expect(await storage.putFromFile('c1', sha, await temporaryFile())).toEqual({ existed: false })
    expect((await storage.read('c1', sha)).toString()).toBe(text)
    const { stream, bytes } = await storage.open('c1', sha)
    let streamed = ''
    for await (const chunk of stream) streamed += chunk
    expect([streamed, bytes]).toEqual([text, text.length])
    expect(await readdir(folder)).toEqual(['objects'])
  })

  it('says when the campaign has the bytes already, and takes the temporary file all the same', async () => {
    await storage.put('c1', sha, Buffer.from(text))
    expect(await storage.putFromFile('c1', sha, await temporaryFile())).toEqual({ existed: true })
    expect(await storage.put('c1', sha, Buffer.from(text))).toEqual({ existed: true })
    expect(await readdir(folder)).toEqual(['objects'])
  })

  it('keeps campaigns apart: removing in one leaves the other', async () => {
    await storage.put('c1', sha, Buffer.from(text))
    await storage.put('c2', sha, Buffer.from(text))
    await storage.remove('c1', sha)
    await storage.remove('c1', sha)
    expect([await storage.exists('c1', sha), await storage.exists('c2', sha)]).toEqual([false, true])
  })

  it('many writers of the same bytes leave one whole object and no part', async () => {
    await Promise.all(Array.from({ length: 20 }, () => storage.put('c1', sha, Buffer.from(text))))
    expect(await readdir(join(folder, 'objects', 'c1', sha.slice(0, 2)))).toEqual([sha])
  })

  it('what is not there is not_found', async () => {
    await expect(storage.read('c1', sha)).rejects.toMatchObject({ code: 'not_found' })
    await expect(storage.open('c1', sha)).rejects.toMatchObject({ code: 'not_found' })
  })

  it('no name leads out of the folder', async () => {
    await expect(async () => storage.read('../c1', sha)).rejects.toThrow(RangeError)
    await expect(async () => storage.read('c1', '../../x')).rejects.toThrow(RangeError)
  })

  it('a full disk is storage_full', async () => {
    await expect(withStorageErrors(() => writeFile('/dev/full', 'x'))).rejects.toMatchObject({ code: 'storage_full' })
  })

  it('check passes in a folder that can be written and fails where a file stands in its place', async () => {
    await storage.check()
    await expect(createFileStorage(await temporaryFile()).check()).rejects.toThrow()
  })
})
