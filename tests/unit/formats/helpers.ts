import type { SpectrumAbout } from '../../../shared/types/spectrum'
import type { ReadOutcome } from '../../../shared/formats/read-spectrum'
import { readSpectrum } from '../../../shared/formats/read-spectrum'

export const bytesOf = (text: string) => new TextEncoder().encode(text)

export function read(content: string | Uint8Array, about?: Partial<SpectrumAbout>): ReadOutcome {
  return readSpectrum(typeof content === 'string' ? bytesOf(content) : content, 'night.csv', about)
}

export function readable(content: string | Uint8Array, about?: Partial<SpectrumAbout>) {
  const outcome = read(content, about)
  if (!outcome.ok) throw new Error(`${outcome.error.code}: ${outcome.error.message}`)
  return outcome
}

export function failure(content: string | Uint8Array, about?: Partial<SpectrumAbout>) {
  const outcome = read(content, about)
  if (outcome.ok) throw new Error('This was read, though it should not have been.')
  return outcome.error
}

export const numbers = (content: string | Uint8Array, about?: Partial<SpectrumAbout>) => {
  const { axis, values, sigma } = readable(content, about).spectrum
  return [[...axis], [...values], sigma && [...sigma]]
}
