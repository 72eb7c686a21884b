import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { mkdtemp, readdir, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { receiveUpload } from '../../../../server/utils/upload'
import type { UploadLimits } from '../../../../server/utils/upload/limits'
import { errorStatus } from '../../../../shared/types/error-codes'
import { DomainError } from '../../../../shared/utils/domain-error'

/** A real server that receives forms and answers with what it got. */
export async function startFormServer(limits?: UploadLimits) {
  const folder = await mkdtemp(join(tmpdir(), 'form-'))
  const server = createServer(async (request, response) => {
    try {
      const upload = await receiveUpload(request, { folder, limits })
      const answer = { files: upload.files, fields: upload.fields }
      await upload.cleanup()
      response.end(JSON.stringify(answer))
    }
    catch (error) {
      const code = error instanceof DomainError ? error.code : 'internal'
      response.statusCode = errorStatus[code]
      response.end(JSON.stringify({ error: { code, message: (error as Error).message } }))
    }
  })
  await new Promise<void>(resolve => server.listen(0, '127.0.0.1', resolve))
  return {
    port: (server.address() as AddressInfo).port,
    leftovers: () => readdir(folder),
    stop: async () => {
      server.closeAllConnections()
      await new Promise(resolve => server.close(resolve))
      await rm(folder, { recursive: true, force: true })
    },
  }
}
