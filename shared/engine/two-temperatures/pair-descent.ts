import { solveLower } from '../linalg/triangular'
import { createShapes, evaluateShapes } from '../line-model/shapes'
import type { Shapes } from '../line-model/shapes'
import type { EnvelopeProblem } from '../envelope/problem'

const maxSteps = 200
/** A descent ends when a step lowers chi2 by less than this part of it. */
const reduction = 1e-9
const firstDamping = 1e-3
const largestDamping = 1e12

/**
 * chi2 of two temperatures with the scales at their best non-negative values, and its descent in (ln beta_a, ln beta_b): variable
 * projection (Golub & Pereyra 1973, derivative of Kaufman 1975) with damping by Levenberg and Marquardt, in place. Nothing is allocated
 * on the way: a bootstrap runs it thousands of times. How the scales are found is the business of those who extend it.
 */
export abstract class PairDescent {
  chi2 = 0
  /** Data in units of their noise. */
  protected readonly y: Float64Array
  /** Whitened f and df / d ln beta of the two gases. */
  protected readonly f: [Float64Array, Float64Array]
  protected readonly d: [Float64Array, Float64Array]
  /** Best scales of the two gases by band. */
  protected readonly scales: [Float64Array, Float64Array]
  /** Half the gradient of chi2, and the Gauss-Newton matrix aa, ab, bb. */
  protected readonly gradient = new Float64Array(2)
  protected readonly normal = new Float64Array(3)
  private readonly shapes: Shapes

  constructor(protected readonly problem: EnvelopeProblem) {
    const { model: { lineCount: n }, bandCount } = problem
    const pair = (length: number): [Float64Array, Float64Array] => [new Float64Array(length), new Float64Array(length)]
    this.y = new Float64Array(n)
    this.f = pair(n)
    this.d = pair(n)
    this.scales = pair(bandCount)
    this.shapes = createShapes(n)
  }

  /** Finds the scales for the columns as they stand, and chi2. */
  protected abstract solveScales(): void
  /** Fills gradient and normal matrix at the point that was solved last. */
  protected abstract linearise(): void

  /**
   * The minimum that a start leads to; the scales at the end are read by `parameters`.
   *
   * @param whitened data in units of their noise, length n
   * @param betas 1/T of the two gases, 1/K, inside the search range
   * @returns chi2
   */
  descend(whitened: Float64Array, betas: readonly [number, number]): number {
    this.y.set(whitened)
    const [low, high] = this.problem.betaRange.map(Math.log)
    let at: [number, number] = [Math.log(betas[0]), Math.log(betas[1])]
    this.evaluate(at)
    this.linearise()
    let best = this.chi2
    let damping = firstDamping
    for (let step = 0; step < maxSteps && damping < largestDamping && best > 0; step++) {
      const trial = this.trial(at, damping, low, high)
      if (trial[0] === at[0] && trial[1] === at[1]) break
      this.evaluate(trial)
      if (!(this.chi2 < best)) {
        damping *= 8
        continue
      }
      const gained = best - this.chi2
      at = trial
      best = this.chi2
      if (gained <= reduction * best && damping <= 1) break
      damping = Math.max(1e-9, damping / 5)
      this.linearise()
    }
    this.evaluate(at)
    this.end = [Math.exp(at[0]), Math.exp(at[1])]
    return this.chi2
  }

  private end: [number, number] = [0, 0]

  /** Where the last descent ended, as parameters of `PairModel`, the cold gas first. */
  parameters(): Float64Array {
    const [a, b] = this.end
    const [cold, hot] = a >= b ? [0, 1] as const : [1, 0] as const
    return Float64Array.of(this.end[cold], this.end[hot], ...this.scales[cold], ...this.scales[hot])
  }

  private evaluate([a, b]: readonly [number, number]): void {
    this.fillColumns(0, Math.exp(a))
    this.fillColumns(1, Math.exp(b))
    this.solveScales()
  }

  private fillColumns(gas: 0 | 1, beta: number): void {
    const { problem: { model, factor, inverseSigma }, shapes: { value, first } } = this
    const f = this.f[gas]
    const d = this.d[gas]
    evaluateShapes(model, beta, this.shapes)
    for (let i = 0; i < f.length; i++) {
      f[i] = factor ? value[i] : value[i] * inverseSigma[i]
      d[i] = (factor ? first[i] : first[i] * inverseSigma[i]) * beta
    }
    this.whitenColumns(f, d)
  }

  /** Only lines with a covariance need more than their sigma. */
  protected whitenColumns(f: Float64Array, d: Float64Array): void {
    const { factor } = this.problem
    if (!factor) return
    solveLower(factor, f.length, f, f)
    solveLower(factor, d.length, d, d)
  }

  private trial(at: readonly [number, number], damping: number, low: number, high: number): [number, number] {
    const { gradient: [ga, gb], normal: [aa, ab, bb] } = this
    const held = (x: number, slope: number) => (x <= low && slope > 0) || (x >= high && slope < 0)
    const freeA = aa > 0 && !held(at[0], ga)
    const freeB = bb > 0 && !held(at[1], gb)
    const [p, q] = [freeA ? aa * (1 + damping) : 1, freeB ? bb * (1 + damping) : 1]
    const mixed = freeA && freeB ? ab : 0
    const determinant = p * q - mixed * mixed
    const stepA = freeA ? (mixed * gb - q * ga) / determinant : 0
    const stepB = freeB ? (mixed * ga - p * gb) / determinant : 0
    return [move(at[0], stepA, low, high), move(at[1], stepB, low, high)]
  }
}

/** At most a factor of e^2 at once, and inside the range. */
function move(x: number, step: number, low: number, high: number): number {
  const length = Number.isFinite(step) ? Math.max(-2, Math.min(2, step)) : 0
  return Math.max(low, Math.min(high, x + length))
}
