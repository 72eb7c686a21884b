import { orderedFlags } from '../flags'
import { chiSquareTail } from '../statistics/chi-square'
import type { LineRetrievalInput, RetrievalResult } from '../types'
import { finiteOrNull } from './finite'
import type { TableFit } from './fit-table'
import { inputFlags } from './input-flags'
import { resultLines } from './result-lines'
import type { LineSelection } from './select-lines'
import { temperatureValue } from './temperature-value'

/** The result of a retrieval that found a temperature. */
export function resultOf(input: LineRetrievalInput, selection: LineSelection, fitted: TableFit): RetrievalResult {
  const { fit, dof, profile, bands } = fitted
  const model = {
    beta: fit.beta,
    referenceEnergy: profile.problem.model.referenceEnergy,
    scaleOf: (band: string) => fit.scales[bands.length === 1 && bands[0] === 'all' ? 0 : bands.indexOf(band)] as number | undefined,
    diagnostics: new Map(),
    sigma: null,
  }
  return {
    temperature: temperatureValue(fitted),
    method: 'envelope',
    strengthSet: input.strengthSet,
    scales: bands.map((band, b) => ({ band, value: fit.scales[b], uNoise: finiteOrNull(Math.sqrt(fit.covariance[(b + 1) * (bands.length + 2)])) })),
    chi2: input.noise === 'from-residuals' ? null : fit.chi2,
    dof,
    pValue: input.noise === 'absolute' && dof > 0 ? chiSquareTail(fit.chi2, dof) : null,
    curvatureZ: null,
    leverArm: null,
    weakestSignalToNoise: null,
    beta: { value: fit.beta, uNoise: fitted.uBeta ?? 0 },
    iterations: fit.iterations,
    converged: true,
    lines: resultLines(input, selection, model),
    plotLines: [],
    crossChecks: [],
    byBand: [],
    flags: orderedFlags(inputFlags(input, selection)),
    cautions: input.cautions ?? [],
    strengthSets: [],
    components: [],
  }
}
