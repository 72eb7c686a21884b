import type { EnvelopeProblem } from '../envelope/problem'
import { PairDescent } from './pair-descent'

/** Sums over the lines of a band. */
interface SlopeSums { uu: number, uv: number, vv: number, ru: number, rv: number, ua: number, ub: number, va: number, vb: number }

/** Two temperatures where bands do not touch (one band, or independent lines): each band has its two scales to itself, in closed form. */
export class SeparateBands extends PairDescent {
  /** Per band: a.a, a.b, b.b, y.a, y.b of the columns. */
  private readonly sums: Float64Array

  constructor(problem: EnvelopeProblem) {
    super(problem)
    this.sums = new Float64Array(5 * problem.bandCount)
  }

  protected solveScales(): void {
    const { y, sums, scales: [sa, sb], f: [fa, fb], problem: { band, bandCount } } = this
    sums.fill(0)
    for (let i = 0; i < y.length; i++) {
      const at = 5 * band[i]
      sums[at] += fa[i] * fa[i]
      sums[at + 1] += fa[i] * fb[i]
      sums[at + 2] += fb[i] * fb[i]
      sums[at + 3] += y[i] * fa[i]
      sums[at + 4] += y[i] * fb[i]
    }
    for (let b = 0; b < bandCount; b++) this.solveBand(b)
    let chi2 = 0
    for (let i = 0; i < y.length; i++) {
      const r = y[i] - sa[band[i]] * fa[i] - sb[band[i]] * fb[i]
      chi2 += r * r
    }
    this.chi2 = chi2
  }

  /** The two best scales that are not negative (Lawson & Hanson 1974, ch. 23, for two columns). */
  private solveBand(b: number): void {
    const { sums, scales } = this
    const [aa, ab, bb, ya, yb] = [sums[5 * b], sums[5 * b + 1], sums[5 * b + 2], sums[5 * b + 3], sums[5 * b + 4]]
    const determinant = aa * bb - ab * ab
    const [sa, sb] = [(ya * bb - yb * ab) / determinant, (yb * aa - ya * ab) / determinant]
    const both = determinant > 1e-14 * aa * bb && sa > 0 && sb > 0
    const aloneA = ya > 0 ? ya * ya / aa : 0
    const aloneB = yb > 0 ? yb * yb / bb : 0
    scales[0][b] = both ? sa : aloneA >= aloneB && aloneA > 0 ? ya / aa : 0
    scales[1][b] = both ? sb : aloneB > aloneA ? yb / bb : 0
  }

  protected linearise(): void {
    this.gradient.fill(0)
    this.normal.fill(0)
    for (let b = 0; b < this.problem.bandCount; b++) this.addBand(b, this.slopeSums(b))
  }

  /** Products of the slopes u = s_a da, v = s_b db with each other, with the residuals, and with the columns. */
  private slopeSums(b: number): SlopeSums {
    const { y, f: [fa, fb], d: [da, db], scales: [sa, sb], problem: { band } } = this
    let uu = 0, uv = 0, vv = 0, ru = 0, rv = 0, ua = 0, ub = 0, va = 0, vb = 0
    for (let i = 0; i < y.length; i++) {
      if (band[i] !== b) continue
      const u = sa[b] * da[i]
      const v = sb[b] * db[i]
      const r = y[i] - sa[b] * fa[i] - sb[b] * fb[i]
      uu += u * u
      uv += u * v
      vv += v * v
      ru += r * u
      rv += r * v
      ua += u * fa[i]
      ub += u * fb[i]
      va += v * fa[i]
      vb += v * fb[i]
    }
    return { uu, uv, vv, ru, rv, ua, ub, va, vb }
  }

  /** What the columns in use can take over of the slopes is taken out of them: -P D c (Kaufman 1975). */
  private addBand(b: number, { uu, uv, vv, ru, rv, ua, ub, va, vb }: SlopeSums): void {
    const { gradient, normal } = this
    const [pu, qu] = this.absorbed(b, ua, ub)
    const [pv, qv] = this.absorbed(b, va, vb)
    normal[0] += uu - pu * ua - qu * ub
    normal[1] += uv - pu * va - qu * vb
    normal[2] += vv - pv * va - qv * vb
    gradient[0] -= ru
    gradient[1] -= rv
  }

  /** Solution of the normal equations of the columns in use. */
  private absorbed(b: number, x: number, z: number): [number, number] {
    const { sums, scales: [sa, sb] } = this
    const [aa, ab, bb] = [sums[5 * b], sums[5 * b + 1], sums[5 * b + 2]]
    if (sa[b] > 0 && sb[b] > 0) return [(x * bb - z * ab) / (aa * bb - ab * ab), (z * aa - x * ab) / (aa * bb - ab * ab)]
    return sa[b] > 0 ? [x / aa, 0] : sb[b] > 0 ? [0, z / bb] : [0, 0]
  }
}
