import type { SpectrumInput, SpectrumMeasurementSummary } from '../types'
import { legendreBasis } from './legendre'
import { lowerBound } from './pixels'
import type { FitProblem } from './problem'

export type Picture = SpectrumMeasurementSummary['picture']

const maxPoints = 4000
/** Significant digits of a drawn number, relative to the largest: a picture needs no more. */
const digits = 7

/** Rounds to a step that is `digits` below the largest magnitude. */
function rounder(values: ArrayLike<number>): (x: number) => number {
  let largest = 0
  for (let i = 0; i < values.length; i++) if (Number.isFinite(values[i])) largest = Math.max(largest, Math.abs(values[i]))
  if (largest === 0) return x => x
  const exponent = digits - 1 - Math.floor(Math.log10(largest))
  if (Math.abs(exponent) > 290) return x => x
  const scale = 10 ** Math.abs(exponent)
  const rounded = exponent >= 0 ? (x: number) => Math.round(x * scale) / scale : (x: number) => Math.round(x / scale) * scale
  // A pixel outside the fit may be so large that scaling it overflows.
  return x => Number.isFinite(rounded(x)) ? rounded(x) : x
}

/** The indices that are drawn: the window with a quarter of its width to either side, every n-th of them, finite values only. */
function drawnIndices({ wavelength, values }: SpectrumInput, [from, to]: [number, number]): number[] {
  const side = (to - from) / 4
  const first = lowerBound(wavelength, from - side)
  const last = lowerBound(wavelength, to + side)
  const stride = Math.max(1, Math.ceil((last - first) / maxPoints))
  const indices: number[] = []
  for (let i = first; i < last; i += stride) if (Number.isFinite(values[i])) indices.push(i)
  return indices
}

/** What the page draws: spectrum, model and continuum around the fit. Model and continuum are null outside the fitted pixels. */
export function drawPicture(spectrum: SpectrumInput, { pixels, system, window }: FitProblem): Picture {
  const lines = system.columns.lines.length
  const basis = legendreBasis(pixels.wavelength, window[0], window[1], system.continuum.length - 1)
  const place = new Map<number, number>()
  pixels.index.forEach((index, p) => place.set(index, p))
  const round = rounder(pixels.values)
  const indices = drawnIndices(spectrum, window)
  const continuumAt = (p: number) => basis.reduce((sum, vector, k) => sum + system.solution[lines + k] * vector[p], 0)
  const inFit = (i: number, value: (p: number) => number) => {
    const p = place.get(i)
    return p === undefined ? null : round(value(p))
  }
  return {
    wavelength: indices.map(i => Math.round(spectrum.wavelength[i] * 1e6) / 1e6),
    values: indices.map(i => round(spectrum.values[i])),
    model: indices.map(i => inFit(i, p => pixels.values[p] - system.residual[p] / pixels.weight[p])),
    continuum: indices.map(i => inFit(i, continuumAt)),
  }
}
