import { orthonormalise } from '../linalg/orthonormalise'
import { solveLower } from '../linalg/triangular'
import { createShapes, evaluateShapes } from '../line-model/shapes'
import type { TableFit } from '../retrieve/fit-table'

/** The fit at its minimum in units of the noise: what leverage, residuals and curvature are made of. */
export interface WhitenedFit {
  /** Model intensity per line. */
  model: Float64Array
  /** intensity - model, per line, not whitened. */
  difference: Float64Array
  /** L^-1 (intensity - model) */
  residuals: Float64Array
  /** Orthonormal basis of the whitened Jacobian for (scales, beta). */
  basis: Float64Array[]
  /** Multiplies by L^-1 (or 1/sigma). */
  whiten: (vector: Float64Array) => Float64Array
}

/** Builds the whitened fit of a table that has a temperature. */
export function whitenFit({ table, profile, fit }: TableFit): WhitenedFit {
  const { problem } = profile
  profile.evaluate(fit.beta)
  const shapes = createShapes(problem.model.lineCount)
  evaluateShapes(problem.model, fit.beta, shapes)
  const whiten = (vector: Float64Array) => problem.factor
    ? solveLower(problem.factor, vector.length, vector)
    : vector.map((value, i) => value * problem.inverseSigma[i])
  const scaleOf = (i: number) => profile.scales[problem.band[i]]
  const model = shapes.value.map((value, i) => scaleOf(i) * value)
  const difference = table.intensity.map((value, i) => value - model[i])
  const columns: Float64Array[] = []
  for (let b = 0; b < problem.bandCount; b++) {
    if (profile.scales[b] > 0) columns.push(whiten(shapes.value.map((value, i) => problem.band[i] === b ? value : 0)))
  }
  columns.push(whiten(shapes.first.map((value, i) => scaleOf(i) * value)))
  return { model, difference, residuals: whiten(difference), basis: orthonormalise(columns), whiten }
}
