import { FormatError } from '../format-error'

/** Bytes to text with `\n` line ends. UTF-8, UTF-16 with a byte order mark, else Latin-1; whatever is not plain UTF-8 is said in `warnings`. */
export function decodeText(bytes: Uint8Array): { text: string, warnings: string[] } {
  const utf16 = utf16Name(bytes)
  if (utf16) return finish(decodeUtf16(bytes, utf16), [`The file is ${utf16.toUpperCase()} text and was read as such.`])
  refuseNul(bytes)
  try {
    return finish(new TextDecoder('utf-8', { fatal: true }).decode(bytes), [])
  }
  catch {
    return finish(new TextDecoder('windows-1252').decode(bytes), ['The file is not UTF-8; it was read as Latin-1 text.'])
  }
}

export function utf16Name(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  if (bytes[0] === 0xFF && bytes[1] === 0xFE) return 'utf-16le'
  if (bytes[0] === 0xFE && bytes[1] === 0xFF) return 'utf-16be'
  return null
}

function decodeUtf16(bytes: Uint8Array, encoding: 'utf-16le' | 'utf-16be'): string {
  if (bytes.length % 2) throw new FormatError('cut_off', 'The file is UTF-16 text and ends within a character: it is cut off. Transfer it again, or save it as UTF-8.', 'end')
  return new TextDecoder(encoding).decode(bytes)
}

function refuseNul(bytes: Uint8Array): void {
  const nul = bytes.indexOf(0)
  if (nul < 0) return
  const everySecond = bytes.length > 3 && (bytes[0] === 0) !== (bytes[1] === 0) && (bytes[2] === 0) !== (bytes[3] === 0)
  const mend = everySecond ? 'It looks like UTF-16 text without a byte order mark: save it as UTF-8.' : 'Save the spectrum as plain text (CSV) or FITS.'
  throw new FormatError('nul_bytes', `The file holds a NUL byte (at byte ${nul + 1}), which text never has. ${mend}`, `byte ${nul + 1}`)
}

function finish(decoded: string, warnings: string[]) {
  const text = decoded.includes('\r') ? decoded.replace(/\r\n?/g, '\n') : decoded
  // eslint-disable-next-line no-control-regex
  const control = text.search(/[\u0000-\u0008\u000E-\u0019\u001B-\u001F]/)
  if (control >= 0) throw new FormatError('binary_file', `The file is not text: character ${control + 1} is a control code. Save the spectrum as plain text (CSV) or FITS.`, `character ${control + 1}`)
  return { text, warnings }
}
