import { createProfile, fitProfile } from '../../shared/engine/envelope/fit-envelope'
import type { EnvelopeProblem } from '../../shared/engine/envelope/problem'
import { SingleProfile } from '../../shared/engine/envelope/single-profile'
import { compileModel } from '../../shared/engine/line-model/compiled-model'
import { defaultTemperatureRange } from '../../shared/engine/thresholds'
import type { ModelLine } from '../../shared/engine/types'

/** 14 invented lines of a rigid rotor, photon emission. */
export const benchLines: ModelLine[] = Array.from({ length: 14 }, (_, i) => ({
  label: `R${i}`,
  band: 'ground',
  components: [{ wavenumber: 3.86 * (i + 1), termUpper: 1.93 * (i + 1) * (i + 2), termLower: 1.93 * i * (i + 1), gUpper: 2 * i + 3, gLower: 2 * i + 1, einsteinA: 1 }],
}))

/** Prepares the fit of many tables of the same lines; the answer is [T, u(T)] per table. */
export function prepareFits(tables: Float64Array[], sigma: Float64Array): () => [number, number][] {
  const [cold, hot] = defaultTemperatureRange
  const problem: EnvelopeProblem = {
    model: compileModel(benchLines, { observable: 'photon-emission' }),
    intensity: new Float64Array(benchLines.length),
    inverseSigma: sigma.map(value => 1 / value),
    factor: null,
    band: new Int32Array(benchLines.length),
    bandCount: 1,
    betaRange: [1 / hot, 1 / cold],
  }
  const profile = createProfile(problem)
  if (!(profile instanceof SingleProfile)) throw new TypeError('The bench expects the lean profile.')
  return () => tables.map((table) => {
    problem.intensity.set(table)
    profile.load()
    const fit = fitProfile(profile)
    if (!fit.converged) throw new Error(fit.reason)
    return [1 / fit.beta, Math.sqrt(fit.covariance[0]) / fit.beta ** 2]
  })
}
