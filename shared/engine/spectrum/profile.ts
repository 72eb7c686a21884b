import { erf } from './erf'

/** FWHM of a Gaussian over its standard deviation. */
export const fwhmPerSigma = 2 * Math.sqrt(2 * Math.LN2)
/** A component is evaluated within this many standard deviations: beyond it the profile is below 1e-9 of its peak. */
export const reach = 6.8

const inverseSqrt2Pi = 1 / Math.sqrt(2 * Math.PI)

/** A component on pixels [start, end): `centre` and standard deviation `sigma` in nm, `share` of its line's unit area; written from index `at` on. */
export interface Placed { start: number, end: number, at: number, centre: number, sigma: number, share: number }
/** Where derivatives are written: by the centre, and by the logarithm of the width. */
export interface SlopeTarget { byShift: Float64Array, byLogWidth: Float64Array }

/** Adds share times a Gaussian of unit area (1/nm). */
export function addGaussian(x: Float64Array, { start, end, at, centre, sigma, share }: Placed, value: Float64Array): void {
  const peak = share * inverseSqrt2Pi / sigma
  for (let p = start, k = at; p < end; p++, k++) {
    const z = (x[p] - centre) / sigma
    value[k] += peak * Math.exp(-0.5 * z * z)
  }
}

/** Adds the derivatives of `addGaussian`. */
export function addGaussianSlopes(x: Float64Array, { start, end, at, centre, sigma, share }: Placed, target: SlopeTarget): void {
  const peak = share * inverseSqrt2Pi / sigma
  for (let p = start, k = at; p < end; p++, k++) {
    const z = (x[p] - centre) / sigma
    const g = peak * Math.exp(-0.5 * z * z)
    target.byShift[k] += g * z / sigma
    target.byLogWidth[k] += g * (z * z - 1)
  }
}

/** The same as `addGaussian`, averaged over each pixel (`width` nm wide): needed when the line is about as narrow as the pixel. */
export function addPixelGaussian(x: Float64Array, width: Float64Array, { start, end, at, centre, sigma, share }: Placed, value: Float64Array): void {
  for (let p = start, k = at; p < end; p++, k++) {
    const h = width[p]
    const low = (x[p] - 0.5 * h - centre) / sigma
    const high = low + h / sigma
    value[k] += share / h * 0.5 * (erf(high * Math.SQRT1_2) - erf(low * Math.SQRT1_2))
  }
}

/** Adds the derivatives of `addPixelGaussian`. */
export function addPixelGaussianSlopes(x: Float64Array, width: Float64Array, { start, end, at, centre, sigma, share }: Placed, target: SlopeTarget): void {
  for (let p = start, k = at; p < end; p++, k++) {
    const h = width[p]
    const low = (x[p] - 0.5 * h - centre) / sigma
    const high = low + h / sigma
    const densityLow = inverseSqrt2Pi * Math.exp(-0.5 * low * low)
    const densityHigh = inverseSqrt2Pi * Math.exp(-0.5 * high * high)
    const scale = share / h
    target.byShift[k] += scale * (densityLow - densityHigh) / sigma
    target.byLogWidth[k] += scale * (low * densityLow - high * densityHigh)
  }
}
