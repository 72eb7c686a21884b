import type { SpectrumInput } from '../types'

/** The pixels that take part in a fit, without masked and unusable ones. */
export interface FitPixels {
  count: number
  /** nm, rising */
  wavelength: Float64Array
  values: Float64Array
  /** 1 / sigma, or 1 when sigma is not known. */
  weight: Float64Array
  /** Width of each pixel, nm. */
  width: Float64Array
  /** Index of each pixel in the spectrum. */
  index: Int32Array
}

/** First index whose wavelength is not below x. */
export function lowerBound(wavelength: ArrayLike<number>, x: number, length = wavelength.length): number {
  let low = 0
  let high = length
  while (low < high) {
    const middle = (low + high) >>> 1
    if (wavelength[middle] < x) low = middle + 1
    else high = middle
  }
  return low
}

/** Width of pixel i as half the distance between its neighbours, nm. */
export function pixelWidth(wavelength: ArrayLike<number>, i: number): number {
  const left = Math.max(0, i - 1)
  const right = Math.min(wavelength.length - 1, i + 1)
  return (wavelength[right] - wavelength[left]) / (right - left)
}

function usable({ values, sigma }: SpectrumInput, i: number): boolean {
  if (!Number.isFinite(values[i])) return false
  return sigma === null || (sigma[i] > 0 && sigma[i] < Infinity)
}

const masked = (x: number, masks: [number, number][]) => masks.some(([from, to]) => x >= Math.min(from, to) && x <= Math.max(from, to))

/** Pixels of the spectrum between two wavelengths (nm) that are not masked and whose value and sigma are usable. */
export function pixelsWithin(spectrum: SpectrumInput, from: number, to: number, masks: [number, number][]): FitPixels {
  const { wavelength, values, sigma } = spectrum
  const chosen: number[] = []
  for (let i = lowerBound(wavelength, from); i < wavelength.length && wavelength[i] <= to; i++) {
    if (usable(spectrum, i) && !masked(wavelength[i], masks)) chosen.push(i)
  }
  const pixels = emptyPixels(chosen.length)
  // A plain loop: Float64Array.from with a function takes twenty times as long.
  for (let p = 0; p < chosen.length; p++) {
    const i = chosen[p]
    pixels.wavelength[p] = wavelength[i]
    pixels.values[p] = values[i]
    pixels.weight[p] = sigma === null ? 1 : 1 / sigma[i]
    pixels.width[p] = pixelWidth(wavelength, i)
    pixels.index[p] = i
  }
  return pixels
}

const emptyPixels = (count: number): FitPixels => ({
  count,
  wavelength: new Float64Array(count),
  values: new Float64Array(count),
  weight: new Float64Array(count),
  width: new Float64Array(count),
  index: new Int32Array(count),
})
