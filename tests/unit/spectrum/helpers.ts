import type { ModelLine, SpectrumInput, SpectrumRetrievalInput } from '#shared/engine/types'
import { seededNormal } from '../engine/helpers/random'
import { secondRadiation } from '../engine/helpers/tables'

/** An invented line at a vacuum wavelength (nm); several wavelengths: components of equal strength. */
export function lineAt(label: string, wavelengths: number | number[], termUpper = 100, band = 'a', einsteinA = 1): ModelLine {
  const components = [wavelengths].flat().map((wavelength) => {
    const wavenumber = 1e7 / wavelength
    return { wavenumber, termUpper, termLower: termUpper - wavenumber, gUpper: 3, gLower: 1, einsteinA }
  })
  return { label, band, components }
}

/** Four invented lines whose areas fall as at 200 K. */
export const ladder: ModelLine[] = [0, 100, 240, 420].map((energy, i) => lineAt(`L${i + 1}`, 1000 + 5 * i, energy))
/** Area of a ladder line, value unit x nm. */
export const ladderArea = (line: ModelLine, temperature = 200, scale = 300) => scale * Math.exp(-secondRadiation * line.components[0].termUpper / temperature)

export interface Drawn { wavelength: number, area: number }

export interface Drawing {
  lines: Drawn[]
  fwhm?: number
  from?: number
  to?: number
  step?: number
  continuum?: (wavelength: number) => number
  /** Constant noise per pixel, and its seed. */
  sigma?: number
  seed?: number | null
  /** Mean over the pixel instead of the value at its centre. */
  integrated?: boolean
}

const gaussian = (x: number, sigma: number) => Math.exp(-0.5 * (x / sigma) ** 2) / (sigma * Math.sqrt(2 * Math.PI))

/** Simpson's rule over a pixel, fine enough for lines of half a pixel. */
function pixelMean(x: number, step: number, sigma: number): number {
  const parts = 40
  let sum = 0
  for (let i = 0; i <= parts; i++) sum += (i === 0 || i === parts ? 1 : i % 2 ? 4 : 2) * gaussian(x - step / 2 + i * step / parts, sigma)
  return sum / (3 * parts)
}

/** Draws Gaussian lines on a continuum. */
export function draw({ lines, fwhm = 0.3, from = 990, to = 1025, step = 0.05, continuum = () => 10, sigma = 1, seed = null, integrated = false }: Drawing): SpectrumInput {
  const width = fwhm / (2 * Math.sqrt(2 * Math.log(2)))
  const profile = (x: number) => integrated ? pixelMean(x, step, width) : gaussian(x, width)
  const noise = seed === null ? () => 0 : seededNormal(seed)
  const wavelength = Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step)
  const values = wavelength.map(x => continuum(x) + lines.reduce((sum, line) => sum + line.area * profile(x - line.wavelength), 0) + sigma * noise())
  return { wavelength, values, sigma: wavelength.map(() => sigma) }
}

/** The ladder's lines as drawn at 200 K, displaced by a shift (nm). */
export const drawnLadder = (shift = 0): Drawn[] => ladder.map(line => ({ wavelength: 1e7 / line.components[0].wavenumber + shift, area: ladderArea(line) }))

/** Input with everything free, changed as asked. */
export function inputFor(spectrum: SpectrumInput, change: Partial<SpectrumRetrievalInput> = {}): SpectrumRetrievalInput {
  return {
    spectrum,
    lines: ladder,
    reading: { observable: 'photon-emission' },
    profile: { shape: 'gaussian', fwhm: null },
    shift: 'free',
    continuumOrder: 1,
    masks: [],
    noise: 'absolute',
    strengthSet: null,
    ...change,
  }
}
