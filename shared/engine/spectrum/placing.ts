import type { ModelLine, SpectrumInput } from '../types'
import { airShift } from '../units/air'
import { lineExtent } from './shares'

export interface RejectedLine { line: ModelLine, reason: string }

const nm = (x: number) => x.toFixed(2)

/** Why the numbers of a spectrum cannot be fitted, in words; null when they can. */
export function spectrumProblem({ wavelength, values, sigma }: SpectrumInput): string | null {
  if (wavelength.length < 5) return `The spectrum has ${wavelength.length} points; at least 5 are needed.`
  if (values.length !== wavelength.length || (sigma && sigma.length !== wavelength.length)) return 'The spectrum\'s columns differ in length.'
  for (let i = 0; i < wavelength.length; i++) {
    if (!(wavelength[i] > 0) || wavelength[i] === Infinity) return `The wavelength of point ${i + 1} is not a positive number.`
    if (i > 0 && !(wavelength[i] > wavelength[i - 1])) return `The wavelengths must rise throughout; they do not at point ${i + 1}.`
  }
  return null
}

export const spectrumRange = ({ wavelength }: SpectrumInput): [number, number] => [wavelength[0], wavelength[wavelength.length - 1]]

/** Lines that stand within the spectrum, and the others with the reason. Lines without a usable wavenumber are among the others. */
export function placeLines(lines: readonly ModelLine[], spectrum: SpectrumInput): { inside: ModelLine[], outside: RejectedLine[] } {
  const [first, last] = spectrumRange(spectrum)
  const inside: ModelLine[] = []
  const outside: RejectedLine[] = []
  for (const line of lines) {
    const [low, high] = lineExtent(line)
    if (low >= first && high <= last) inside.push(line)
    else if (!Number.isFinite(low) || !Number.isFinite(high)) outside.push({ line, reason: 'the line has no usable wavenumber' })
    else outside.push({ line, reason: `it stands at ${nm((low + high) / 2)} nm, outside the spectrum (${nm(first)} to ${nm(last)} nm)` })
  }
  return { inside, outside }
}

/** Both ranges in words, for a spectrum that holds none of the lines; says so when what separates them is what air does. */
export function noneInside(lines: readonly ModelLine[], spectrum: SpectrumInput): string {
  const [first, last] = spectrumRange(spectrum)
  const extents = lines.map(lineExtent).filter(([low, high]) => Number.isFinite(low) && Number.isFinite(high))
  if (extents.length === 0) return 'None of the chosen lines has a usable wavenumber.'
  const low = Math.min(...extents.map(extent => extent[0]))
  const high = Math.max(...extents.map(extent => extent[1]))
  const ranges = `No chosen line lies in the spectrum: the lines stand at ${nm(low)} to ${nm(high)} nm (vacuum), the spectrum covers ${nm(first)} to ${nm(last)} nm.`
  const apart = Math.max(0, low - last, first - high)
  const air = airShift((low + high) / 2)
  return apart <= 1.2 * air ? `${ranges} They miss each other by no more than air shifts a line there (${air.toFixed(3)} nm): is the medium stated rightly?` : ranges
}
