import { legendreBasis } from './legendre'

/** Continuum at a wavelength (nm) from its Legendre coefficients over a window. */
export function continuumAt(coefficients: readonly number[], window: [number, number], wavelength: number): number {
  const basis = legendreBasis(Float64Array.of(wavelength), window[0], window[1], coefficients.length - 1)
  return coefficients.reduce((sum, c, k) => sum + c * basis[k][0], 0)
}
