import { createShapes, evaluateShapes } from '../line-model/shapes'
import type { EnvelopeProblem } from './problem'

/**
 * A start for beta from the straight line of ln(I / model at beta0) on energy, one intercept per band,
 * weights (I/sigma)^2, lines whose sign fits the model only. Used as a start, never as a result.
 *
 * @returns beta, or NaN when no band has two such lines
 */
export function logStart(problem: EnvelopeProblem, beta0: number): number {
  const { model, intensity, band, bandCount } = problem
  const shapes = createShapes(model.lineCount)
  evaluateShapes(model, beta0, shapes)
  const sums = new Float64Array(5 * bandCount)
  for (let i = 0; i < model.lineCount; i++) {
    const ratio = intensity[i] / shapes.value[i]
    if (!(ratio > 0 && ratio < Infinity)) continue
    const relative = intensity[i] * inverseSigmaOf(problem, i)
    const weight = relative * relative
    const e = meanEnergy(problem, i)
    const y = Math.log(ratio)
    const at = 5 * band[i]
    sums[at] += weight
    sums[at + 1] += weight * e
    sums[at + 2] += weight * y
    sums[at + 3] += weight * e * e
    sums[at + 4] += weight * e * y
  }
  let see = 0
  let sey = 0
  for (let b = 0; b < bandCount; b++) {
    const [w, we, wy, wee, wey] = sums.subarray(5 * b, 5 * b + 5)
    if (!(w > 0)) continue
    see += wee - we * we / w
    sey += wey - we * wy / w
  }
  return see > 0 ? beta0 - sey / see : Number.NaN
}

function inverseSigmaOf({ factor, inverseSigma, model }: EnvelopeProblem, i: number): number {
  if (!factor) return inverseSigma[i]
  const n = model.lineCount
  let variance = 0
  for (let k = 0; k <= i; k++) variance += factor[i * n + k] ** 2
  return 1 / Math.sqrt(variance)
}

function meanEnergy({ model }: EnvelopeProblem, i: number): number {
  let sum = 0
  for (let c = model.starts[i]; c < model.starts[i + 1]; c++) sum += model.energy[c]
  return sum / (model.starts[i + 1] - model.starts[i])
}
