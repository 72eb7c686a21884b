import type { FitPixels } from './pixels'
import { lowerBound } from './pixels'
import type { Placed } from './profile'
import { addGaussian, addGaussianSlopes, addPixelGaussian, addPixelGaussianSlopes, fwhmPerSigma, reach } from './profile'

/** A line as the fit sees it: one area, shared out over components at their own wavelengths (vacuum nm). */
export interface FitLine { components: { wavelength: number, share: number }[] }

/**
 * The columns of the lines: each line's weighted profile and, on demand, its derivatives, kept only over the pixels that it reaches.
 * Column i covers pixels [start[i], end[i]); its numbers begin at offset[i] of the three arrays.
 */
export class LineColumns {
  readonly start: Int32Array
  readonly end: Int32Array
  readonly offset: Int32Array
  value = new Float64Array(0)
  byShift = new Float64Array(0)
  byLogWidth = new Float64Array(0)
  private total = 0
  private readonly extents: [low: number, high: number][]
  /** Components of each line where `fill` put them. */
  private readonly placed: Placed[][]

  /** @param lines sorted by their lowest wavelength */
  constructor(readonly pixels: FitPixels, readonly lines: FitLine[], readonly integrated: boolean) {
    this.start = new Int32Array(lines.length)
    this.end = new Int32Array(lines.length)
    this.offset = new Int32Array(lines.length)
    this.extents = lines.map(({ components }) => extentOf(components.map(({ wavelength }) => wavelength)))
    this.placed = lines.map(({ components }) => components.map(({ share }) => ({ start: 0, end: 0, at: 0, centre: 0, sigma: 1, share })))
  }

  /** Evaluates every column at a shift (nm) and a FWHM (nm). */
  fill(shift: number, fwhm: number): void {
    const sigma = fwhm / fwhmPerSigma
    this.layOut(shift, reach * sigma)
    if (this.value.length < this.total) this.value = new Float64Array(Math.ceil(1.3 * this.total))
    else this.value.fill(0, 0, this.total)
    for (let i = 0; i < this.lines.length; i++) this.fillLine(i, shift, sigma)
  }

  /** Evaluates the derivatives where `fill` left the columns; most points of a search never need them. */
  fillSlopes(): void {
    if (this.byShift.length < this.total) this.growSlopes(this.value.length)
    this.byShift.fill(0, 0, this.total)
    this.byLogWidth.fill(0, 0, this.total)
    for (let i = 0; i < this.lines.length; i++) this.fillSlopesOf(i)
  }

  private layOut(shift: number, radius: number): void {
    const { wavelength, count } = this.pixels
    let total = 0
    for (let i = 0; i < this.lines.length; i++) {
      const [low, high] = this.extents[i]
      this.start[i] = lowerBound(wavelength, low + shift - radius, count)
      this.end[i] = lowerBound(wavelength, high + shift + radius, count)
      this.offset[i] = total
      total += this.end[i] - this.start[i]
    }
    this.total = total
  }

  private growSlopes(size: number): void {
    this.byShift = new Float64Array(size)
    this.byLogWidth = new Float64Array(size)
  }

  private fillLine(i: number, shift: number, sigma: number): void {
    const { wavelength, width, weight, count } = this.pixels
    const { value } = this
    this.placed[i].forEach((place, c) => {
      place.centre = this.lines[i].components[c].wavelength + shift
      place.sigma = sigma
      place.start = lowerBound(wavelength, place.centre - reach * sigma, count)
      place.end = lowerBound(wavelength, place.centre + reach * sigma, count)
      place.at = this.offset[i] + place.start - this.start[i]
      if (this.integrated) addPixelGaussian(wavelength, width, place, value)
      else addGaussian(wavelength, place, value)
    })
    for (let p = this.start[i], k = this.offset[i]; p < this.end[i]; p++, k++) value[k] *= weight[p]
  }

  private fillSlopesOf(i: number): void {
    const { wavelength, width, weight } = this.pixels
    const { byShift, byLogWidth } = this
    for (const place of this.placed[i]) {
      if (this.integrated) addPixelGaussianSlopes(wavelength, width, place, this)
      else addGaussianSlopes(wavelength, place, this)
    }
    for (let p = this.start[i], k = this.offset[i]; p < this.end[i]; p++, k++) {
      byShift[k] *= weight[p]
      byLogWidth[k] *= weight[p]
    }
  }
}

const extentOf = (wavelengths: number[]): [number, number] => [Math.min(...wavelengths), Math.max(...wavelengths)]
