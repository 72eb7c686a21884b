import { C2 } from '../constants'
import { lineStrength } from '../line-model/line-strength'
import { shapeExponent, shapeExponentRate } from '../line-model/shapes'
import type { LeastSquaresResult } from '../optimise/types'
import type { TableFit } from '../retrieve/fit-table'
import type { Interval, PlotLine, TwoTemperatureGas } from '../types'
import type { PairModel } from './pair-model'

/** What is known of one of the two gases. */
export interface GasFit {
  fitted: TableFit
  model: PairModel
  fit: LeastSquaresResult
  /** 0: the cold one, 1: the hot one. */
  gas: 0 | 1
  /** Factor from the stated covariance to the real one. */
  varianceFactor: number
}

/** Standard uncertainty of the gas's beta, 1/K; null at an end of the range and where the lines do not determine it. */
export function betaUncertainty({ fit, gas, varianceFactor }: GasFit): number | null {
  const variance = fit.covariance && fit.atBound[gas] === null ? fit.covariance[gas * (fit.value.length + 1)] * varianceFactor : 0
  return variance > 0 && variance < Infinity ? Math.sqrt(variance) : null
}

/** The gas as it stands in a result. */
export function gasOf(source: GasFit, interval68: Interval, interval95: Interval): TwoTemperatureGas {
  const { fit, gas, model } = source
  const beta = fit.value[gas]
  const uBeta = betaUncertainty(source)
  const parts = model.intensities(fit.value).map(values => values.reduce((sum, value) => sum + Math.abs(value), 0))
  const scales = scalesOf(source)
  return {
    temperature: { value: 1 / beta, uNoise: uBeta === null ? null : uBeta / beta ** 2, interval68, interval95, unit: 'K' },
    scales,
    share: parts[gas] / (parts[0] + parts[1]),
    plotLines: gasPlotLines(source, scales),
  }
}

/** Scales for w and energies above the lowest used one; the common factor of the shapes follows beta, and so does their uncertainty. */
function scalesOf({ fitted, model, fit, gas, varianceFactor }: GasFit): TwoTemperatureGas['scales'] {
  const { model: lines } = model.problem
  const n = fit.value.length
  const beta = fit.value[gas]
  const unit = Math.exp(shapeExponent(lines, beta)) / lines.strengthUnit
  const rate = shapeExponentRate(lines, beta)
  return fitted.bands.map((band, b) => {
    const j = 2 + gas * model.bandCount + b
    const s = fit.value[j]
    const at = (p: number, q: number) => fit.covariance![p * n + q]
    // d(scale) = unit (d s + s rate d beta)
    const variance = fit.covariance && at(j, j) + 2 * s * rate * at(j, gas) + (s * rate) ** 2 * at(gas, gas)
    const uNoise = variance === null || !(variance > 0) ? null : unit * Math.sqrt(variance * varianceFactor)
    return { band, value: s * unit, uNoise: uNoise !== null && Number.isFinite(uNoise) ? uNoise : null }
  })
}

/** Straight lines of the Boltzmann plot, one per band in which the gas is seen. */
function gasPlotLines({ fitted: { table, bands }, model, fit, gas }: GasFit, scales: TwoTemperatureGas['scales']): PlotLine[] {
  const beta = fit.value[gas]
  return [...new Set(table.lines.map(line => line.band))].flatMap((band) => {
    const scale = scales[table.bandScales === 'common' ? 0 : bands.indexOf(band)].value
    const intercept = Math.log(scale) + beta * C2 * model.problem.model.referenceEnergy
    if (!Number.isFinite(intercept)) return []
    const energies = table.lines.filter(line => line.band === band).map(line => lineStrength(line, table.reading).termEnergy)
    return [{ band, intercept, slope: -beta * C2, energyRange: [Math.min(...energies), Math.max(...energies)] }]
  })
}
