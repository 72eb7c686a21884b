import { C2 } from '../constants'
import { lineStrength } from '../line-model/line-strength'
import { lineValue } from '../line-model/line-value'
import type { LineTable } from '../retrieve/line-table'

/** Temperature from two lines, K, with its standard uncertainty. */
export interface TwoLineTemperature { temperature: number, uncertainty: number }

/**
 * Estimator 3. T = C2 (E2 - E1) / ln(I1 w2 / (I2 w1)); u(T) = T^2 u(ln ratio) / |d ln(m1/m2) / d beta|, covariance of the two lines included.
 * Where phi is more than an exponential the same form is repeated with that part taken at the last temperature.
 *
 * @param first, second indices into the table; lines of one scale
 * @param noiseFactor from the table's sigmas to real ones
 * @param startBeta where the repetition starts, 1/K; the closed form needs none
 * @returns null when the ratio has no positive finite temperature
 */
export function twoLineTemperature(table: LineTable, first: number, second: number, noiseFactor = 1, startBeta?: number): TwoLineTemperature | null {
  const beta = solveRatio(table, first, second, startBeta)
  if (beta === null) return null
  const slope = logSlope(table, first, beta) - logSlope(table, second, beta)
  const temperature = 1 / beta
  const uncertainty = temperature ** 2 * noiseFactor * logRatioNoise(table, first, second) / Math.abs(slope)
  return Number.isFinite(temperature) && Number.isFinite(uncertainty) ? { temperature, uncertainty } : null
}

function solveRatio(table: LineTable, first: number, second: number, startBeta?: number): number | null {
  const { lines, reading, intensity } = table
  const a = lineStrength(lines[first], reading)
  const b = lineStrength(lines[second], reading)
  if (a.termEnergy === b.termEnergy) return null
  const closed = (wa: number, wb: number) => Math.log(intensity[first] * wb / (intensity[second] * wa)) / (C2 * (b.termEnergy - a.termEnergy))
  let beta = startBeta ?? closed(a.strength, b.strength)
  for (let round = 0; round < 200; round++) {
    if (!(beta > 0 && beta < Infinity)) return null
    const next = closed(lineValue(lines[first], reading, beta, a.termEnergy).value, lineValue(lines[second], reading, beta, b.termEnergy).value)
    if (Math.abs(next - beta) <= 1e-14 * beta) return next
    beta = next
  }
  return null
}

function logSlope({ lines, reading }: LineTable, i: number, beta: number): number {
  return lineValue(lines[i], reading, beta, lineStrength(lines[i], reading).termEnergy).logSlope - C2 * lineStrength(lines[i], reading).termEnergy
}

function logRatioNoise({ lines, intensity, sigma, covariance }: LineTable, first: number, second: number): number {
  const shared = covariance ? covariance[first * lines.length + second] : 0
  const variance = (sigma[first] / intensity[first]) ** 2 + (sigma[second] / intensity[second]) ** 2 - 2 * shared / (intensity[first] * intensity[second])
  return Math.sqrt(Math.max(0, variance))
}
