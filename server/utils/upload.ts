import { mkdir, mkdtemp, rm } from 'node:fs/promises'
import type { IncomingMessage } from 'node:http'
import { join } from 'node:path'
import { withStorageErrors } from '../services/storage/storage-error'
import { refuseEncoded } from './content-encoding'
import { drain } from './upload/drain'
import type { UploadLimits } from './upload/limits'
import { uploadLimits } from './upload/limits'
import type { ReceivedParts } from './upload/receive-parts'
import { receiveParts } from './upload/receive-parts'
import { noFile, notMultipart, requestTooLarge } from './upload/refusals'

export interface Upload extends ReceivedParts {
  /** Removes the temporary files that were not moved away. Call it in a `finally`. */
  cleanup: () => Promise<void>
}

/**
 * Receives a multipart form: files streamed to temporary files below `folder` while they are hashed.
 * Authorise before calling. Throws `DomainError` (413, 415, 400, 503) with nothing left on the disk;
 * the rest of a refused body is drained, so that the client sees the answer.
 */
export async function receiveUpload(request: IncomingMessage, options: { folder: string, limits?: UploadLimits }): Promise<Upload> {
  const limits = options.limits ?? uploadLimits
  try {
    refuseByHeaders(request, limits)
    return await withStorageErrors(() => receiveInto(request, options.folder, limits))
  }
  catch (error) {
    drain(request)
    throw error
  }
}

function refuseByHeaders(request: IncomingMessage, limits: UploadLimits): void {
  refuseEncoded(request)
  if (!/^multipart\/form-data\b/i.test(request.headers['content-type'] ?? '')) throw notMultipart()
  if (Number(request.headers['content-length'] ?? 0) > limits.requestBytes) throw requestTooLarge(limits)
}

async function receiveInto(request: IncomingMessage, folder: string, limits: UploadLimits): Promise<Upload> {
  await mkdir(folder, { recursive: true })
  const directory = await mkdtemp(join(folder, 'upload-'))
  const cleanup = () => rm(directory, { recursive: true, force: true })
  try {
    const parts = await receiveParts(request, directory, limits)
    if (parts.files.length === 0) throw noFile(parts.fields)
    return { ...parts, cleanup }
  }
  catch (error) {
    await cleanup()
    throw error
  }
}
