import { lineStrength } from '../line-model/line-strength'
import { lineValue } from '../line-model/line-value'
import type { LineRetrievalInput, MeasuredLine, ObservableReading, ResultLine } from '../types'
import { finiteOrNull } from './finite'
import type { LineSelection } from './select-lines'

/** A fitted model as the result's lines read it. */
export interface FittedModel {
  beta: number
  /** Lowest used energy, cm^-1. */
  referenceEnergy: number
  scaleOf: (band: string) => number | undefined
  /** Diagnostics of the used lines by index in the input. */
  diagnostics: Map<number, { residual: number | null, leverage: number | null, temperatureWithout: number | null }>
  /** Noise per line when it came from the residuals. */
  sigma: number | null
}

/** One result line for every line of the input, in its order. Without a model the fitted columns are null. */
export function resultLines(input: LineRetrievalInput, selection: LineSelection, model: FittedModel | null): ResultLine[] {
  return input.lines.map((line, i) => {
    const used = selection.used.includes(i)
    const diagnostics = model?.diagnostics.get(i)
    const reason = selection.reasons.get(i) ?? line.reason
    return {
      label: line.label,
      band: line.band,
      ...place(line, input.reading),
      intensity: finiteOrNull(line.intensity) ?? 0,
      ...noiseAndPlot(line, sigmaOfLine(input, i, model), input.reading, model),
      model: model ? modelValue(line, input.reading, model) : null,
      residual: diagnostics?.residual ?? null,
      leverage: diagnostics?.leverage ?? null,
      temperatureWithout: diagnostics?.temperatureWithout ?? null,
      used,
      ...(!used && reason !== undefined ? { reason } : {}),
    }
  })
}

function place(line: MeasuredLine, reading: ObservableReading): Pick<ResultLine, 'termEnergy' | 'wavenumber' | 'strength'> {
  const { strength, termEnergy, wavenumber } = lineStrength(line, reading)
  return { strength: finiteOrNull(strength) ?? 0, termEnergy: finiteOrNull(termEnergy) ?? 0, wavenumber: finiteOrNull(wavenumber) ?? 0 }
}

function sigmaOfLine(input: LineRetrievalInput, i: number, model: FittedModel | null): number | null {
  if (input.covariance) return finiteOrNull(Math.sqrt(input.covariance[i * input.lines.length + i]))
  return finiteOrNull(input.noise === 'from-residuals' ? model?.sigma : input.lines[i].sigma)
}

/** sigma and the Boltzmann plot's ordinate. */
function noiseAndPlot(line: MeasuredLine, sigma: number | null, reading: ObservableReading, model: FittedModel | null): Pick<ResultLine, 'sigma' | 'logRatio' | 'sigmaLogRatio'> {
  const logRatio = line.mixesBands ? null : finiteOrNull(Math.log(line.intensity / plotStrength(line, reading, model?.beta ?? 0)))
  return { sigma, logRatio, sigmaLogRatio: logRatio === null || sigma === null ? null : finiteOrNull(sigma / line.intensity) }
}

/**
 * The w of the Boltzmann plot: the strength, times whatever of phi is not exp(-C2 E/T) at the fitted T
 * (stimulated emission, background), so that the points of every observable lie on one straight line.
 */
export function plotStrength(line: MeasuredLine, reading: ObservableReading, beta: number): number {
  const { strength, termEnergy } = lineStrength(line, reading)
  if (!(beta > 0)) return strength
  return lineValue(line, reading, beta, termEnergy).value
}

function modelValue(line: MeasuredLine, reading: ObservableReading, model: FittedModel): number | null {
  const scale = model.scaleOf(line.band)
  if (line.mixesBands || scale === undefined || !(lineStrength(line, reading).strength > 0)) return null
  return finiteOrNull(scale * lineValue(line, reading, model.beta, model.referenceEnergy).value)
}
