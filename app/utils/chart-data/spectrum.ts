import type { PictureData } from '#shared/types/retrieval'

export interface Point { x: number, y: number | null }
export interface SpectrumSeries { data: Point[], model: Point[], continuum: Point[], residual: Point[] }

/** Observed minus model in percent-free units of the data; null outside the fitted pixels, so that no line is drawn there. */
export function spectrumSeries(picture: PictureData): SpectrumSeries {
  const at = (values: (number | null)[]) => picture.wavelength.map((x, index) => ({ x, y: values[index] ?? null }))
  const residual = picture.values.map((value, index) => {
    const model = picture.model[index]
    return model == null ? null : value - model
  })
  return { data: at(picture.values), model: at(picture.model), continuum: at(picture.continuum), residual: at(residual) }
}

/** The wavelengths the fit took part in, with a margin of five per cent; the whole axis where nothing was fitted. */
export function fittedRange(picture: PictureData): [number, number] | null {
  const fitted = picture.wavelength.filter((_, index) => picture.model[index] != null)
  const all = fitted.length ? fitted : picture.wavelength
  if (!all.length) return null
  const low = all[0]!
  const high = all.at(-1)!
  const pad = fitted.length ? 0.05 * (high - low) : 0
  return [Math.max(low - pad, picture.wavelength[0]!), Math.min(high + pad, picture.wavelength.at(-1)!)]
}
