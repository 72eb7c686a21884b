import type { EnvelopeProblem } from '#shared/engine/envelope/problem'
import { cholesky } from '#shared/engine/linalg/cholesky'
import { compileModel } from '#shared/engine/line-model/compiled-model'
import type { LineRetrievalInput } from '#shared/engine/types'

/** The envelope problem of an input whose lines are all used. */
export function problemOf(input: LineRetrievalInput, { covariance }: { covariance?: number[] } = {}): EnvelopeProblem {
  const bands = [...new Set(input.lines.map(line => line.band))]
  return {
    model: compileModel(input.lines, input.reading),
    intensity: Float64Array.from(input.lines, line => line.intensity),
    inverseSigma: Float64Array.from(input.lines, line => 1 / line.sigma!),
    factor: covariance ? cholesky(covariance, input.lines.length) : null,
    band: Int32Array.from(input.lines, line => bands.indexOf(line.band)),
    bandCount: bands.length,
    betaRange: [1 / 20000, 1 / 2],
  }
}

/** diag(sigma^2) with a correlation between neighbours. */
export function neighbourCovariance(input: LineRetrievalInput, correlation: number): number[] {
  const sigma = input.lines.map(line => line.sigma!)
  return sigma.flatMap((a, i) => sigma.map((b, j) => a * b * (i === j ? 1 : Math.abs(i - j) === 1 ? correlation : 0)))
}
