import { DomainError } from '../../../shared/utils/domain-error'
import type { UploadLimits } from './limits'
import { inWords } from './limits'

const namelessFile = 'The part "files" has no filename, so that it was taken for a plain field. Send it with a filename.'
const shown = (text: string) => text.slice(0, 60)

export const requestTooLarge = (limits: UploadLimits) => new DomainError('payload_too_large', `One request takes at most ${inWords(limits.requestBytes)}. Send the files in several requests.`)
export const fileTooLarge = (name: string, limits: UploadLimits) => new DomainError('payload_too_large', `A file takes at most ${inWords(limits.fileBytes)}; "${name}" is larger. Cut the spectrum to the range of the lines.`, [{ path: 'files', message: `"${name}" is larger than ${inWords(limits.fileBytes)}.` }])
export const tooManyFiles = (limits: UploadLimits) => new DomainError('payload_too_large', `One request takes at most ${limits.files} files. Send them in several requests.`)
export const tooManyFields = (limits: UploadLimits) => new DomainError('payload_too_large', `One request takes at most ${limits.fields} fields beside its files.`)
export const fieldTooLarge = (name: string, limits: UploadLimits) => new DomainError('payload_too_large', `The field "${shown(name)}" is larger than ${inWords(limits.fieldBytes)}.${name === 'files' ? ` ${namelessFile}` : ''}`)
export const noFile = (fields: Record<string, string>) => malformed('files' in fields ? namelessFile : 'The form holds no file. Put the files into parts named "files".')
export const encodedPart = (name: string, encoding: string) => malformed(`"${shown(name)}" comes as Content-Transfer-Encoding: ${shown(encoding)}. Forms carry files as they are: leave that header out.`)
export const notMultipart = () => new DomainError('unsupported_media_type', 'Send the files as multipart/form-data.')
export const malformed = (what: string) => new DomainError('malformed_upload', what)
export const cutOff = () => malformed('The upload was cut off before its end. Send it again.')
