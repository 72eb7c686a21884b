import type { FitPixels } from './pixels'
import { lowerBound } from './pixels'
import { addGaussian, addPixelGaussian, fwhmPerSigma, reach } from './profile'

/** A line as the fit sees it: one area, shared out over components at their own wavelengths (vacuum nm). */
export interface FitLine { components: { wavelength: number, share: number }[] }

/**
 * The columns of the lines: each line's weighted profile and its derivatives, kept only over the pixels that it reaches.
 * Column i covers pixels [start[i], end[i]); its numbers begin at offset[i] of the three arrays.
 */
export class LineColumns {
  readonly start: Int32Array
  readonly end: Int32Array
  readonly offset: Int32Array
  value = new Float64Array(0)
  byShift = new Float64Array(0)
  byLogWidth = new Float64Array(0)

  /** @param lines sorted by their lowest wavelength */
  constructor(readonly pixels: FitPixels, readonly lines: FitLine[], readonly integrated: boolean) {
    this.start = new Int32Array(lines.length)
    this.end = new Int32Array(lines.length)
    this.offset = new Int32Array(lines.length)
  }

  /** Evaluates every column at a shift (nm) and a FWHM (nm). */
  fill(shift: number, fwhm: number): void {
    const total = this.layOut(shift, reach * fwhm / fwhmPerSigma)
    if (this.value.length < total) this.grow(Math.ceil(1.3 * total))
    else this.clear(total)
    for (let i = 0; i < this.lines.length; i++) this.fillLine(i, shift, fwhm / fwhmPerSigma)
  }

  private layOut(shift: number, radius: number): number {
    const { wavelength, count } = this.pixels
    let total = 0
    for (let i = 0; i < this.lines.length; i++) {
      let low = Infinity
      let high = -Infinity
      for (const component of this.lines[i].components) {
        low = Math.min(low, component.wavelength)
        high = Math.max(high, component.wavelength)
      }
      this.start[i] = lowerBound(wavelength, low + shift - radius, count)
      this.end[i] = lowerBound(wavelength, high + shift + radius, count)
      this.offset[i] = total
      total += this.end[i] - this.start[i]
    }
    return total
  }

  private grow(size: number): void {
    this.value = new Float64Array(size)
    this.byShift = new Float64Array(size)
    this.byLogWidth = new Float64Array(size)
  }

  private clear(total: number): void {
    this.value.fill(0, 0, total)
    this.byShift.fill(0, 0, total)
    this.byLogWidth.fill(0, 0, total)
  }

  private fillLine(i: number, shift: number, sigma: number): void {
    const { wavelength, width, weight, count } = this.pixels
    for (const component of this.lines[i].components) {
      const centre = component.wavelength + shift
      const from = lowerBound(wavelength, centre - reach * sigma, count)
      const to = lowerBound(wavelength, centre + reach * sigma, count)
      const at = this.offset[i] + from - this.start[i]
      if (this.integrated) addPixelGaussian(wavelength, width, from, to, at, centre, sigma, component.share, this)
      else addGaussian(wavelength, from, to, at, centre, sigma, component.share, this)
    }
    for (let p = this.start[i], k = this.offset[i]; p < this.end[i]; p++, k++) {
      this.value[k] *= weight[p]
      this.byShift[k] *= weight[p]
      this.byLogWidth[k] *= weight[p]
    }
  }
}
