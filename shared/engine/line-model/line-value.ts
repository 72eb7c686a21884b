import { C2 } from '../constants'
import type { ModelLine, ObservableReading } from '../types'
import { compileModel } from './compiled-model'
import { createShapes, evaluateShapes, shapeExponent } from './shapes'

/** w phi of one line and its logarithmic derivative in beta. */
export interface LineValue {
  /** w phi with energies above `referenceEnergy`. */
  value: number
  /** d ln(w phi) / d beta, K. */
  logSlope: number
}

/**
 * w phi(T) of one line at beta = 1/T (1/K), energies above `referenceEnergy` (cm^-1).
 * The value is 0 or Infinity where a line lies so far from the reference that doubles cannot hold it.
 */
export function lineValue(line: ModelLine, reading: ObservableReading, beta: number, referenceEnergy: number): LineValue {
  const model = compileModel([line], reading)
  const shapes = createShapes(1)
  evaluateShapes(model, beta, shapes)
  const above = C2 * (model.referenceEnergy - referenceEnergy)
  const exponent = -beta * above - shapeExponent(model, beta)
  const rate = -above - (shapeExponent(model, beta) / beta)
  return { value: shapes.value[0] * model.strengthUnit * Math.exp(exponent), logSlope: shapes.first[0] / shapes.value[0] + rate }
}
