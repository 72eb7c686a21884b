import { orderedFlags } from '../flags'
import { chiSquareTail } from '../statistics/chi-square'
import { defaultTemperatureRange } from '../thresholds'
import type { LineRetrievalInput, RetrievalResult, TemperatureValue } from '../types'
import { diagnose } from './diagnose'
import { finiteOrNull } from './finite'
import type { TableFit } from './fit-table'
import { inputFlags } from './input-flags'
import { plotLines } from './plot-lines'
import { resultFlags } from './result-flags'
import { resultLines } from './result-lines'
import type { LineSelection } from './select-lines'

/** The result of a retrieval that found a temperature. */
export function resultOf(input: LineRetrievalInput, selection: LineSelection, fitted: TableFit, noise: TemperatureValue): RetrievalResult {
  const { fit, dof } = fitted
  const { diagnosis, model } = diagnose(input, selection, fitted)
  // JCGM 100:2008, 5.1.2: components combine in quadrature, at the very end.
  const temperature = { ...noise, uSystematic: Math.hypot(...diagnosis.components.map(component => component.kelvin)) }
  const result: Omit<RetrievalResult, 'flags'> = {
    temperature,
    method: input.twoTemperatures ? 'two-temperature' : 'envelope',
    strengthSet: input.strengthSet,
    scales: scalesOf(fitted),
    chi2: input.noise === 'from-residuals' ? null : fit.chi2,
    dof,
    pValue: input.noise === 'absolute' && dof > 0 ? chiSquareTail(fit.chi2, dof) : null,
    beta: { value: fit.beta, uNoise: fitted.uBeta ?? 0 },
    iterations: fit.iterations,
    converged: true,
    ...diagnosis,
    lines: resultLines(input, selection, model),
    plotLines: plotLines(fitted),
    cautions: input.cautions ?? [],
  }
  const range = input.temperatureRange ?? defaultTemperatureRange
  return { ...result, flags: orderedFlags([...inputFlags(input, selection), ...resultFlags(result, temperature, range)]) }
}

/** Scales for w and energies above the lowest used one, with their uncertainty; not known with relative noise and no degree of freedom. */
function scalesOf({ fit, bands, varianceFactor }: TableFit): RetrievalResult['scales'] {
  const size = bands.length + 1
  return bands.map((band, b) => ({
    band,
    value: finiteOrNull(fit.scales[b]) ?? 0,
    uNoise: varianceFactor === null ? null : finiteOrNull(Math.sqrt(fit.covariance[(b + 1) * (size + 1)] * varianceFactor)),
  }))
}
