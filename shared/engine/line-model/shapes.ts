import type { CompiledModel } from './compiled-model'

/** Per-line sums over components of w phi and its first two derivatives in beta = 1/T. */
export interface Shapes {
  value: Float64Array
  first: Float64Array
  second: Float64Array
}

export function createShapes(lineCount: number): Shapes {
  return { value: new Float64Array(lineCount), first: new Float64Array(lineCount), second: new Float64Array(lineCount) }
}

/**
 * Evaluates w phi(T), d/dbeta and d2/dbeta2 of every line.
 * Values carry the factor exp(shapeExponent(model, beta)) relative to energies above `referenceEnergy`,
 * the same for all lines, so that nothing overflows; ratios between lines are exact.
 *
 * @param beta 1/T, 1/K, > 0
 * @param out receives one value per line
 */
export function evaluateShapes(model: CompiledModel, beta: number, out: Shapes): void {
  if (model.kind === 'plain') evaluatePlain(model, beta, out)
  else if (model.kind === 'stimulated') evaluateStimulated(model, beta, out)
  else if (beta < model.backgroundBeta) evaluateAboveBackground(model, beta, out)
  else evaluateBelowBackground(model, beta, out)
}

/** ln of the common factor by which `evaluateShapes` multiplies w phi with energies above `referenceEnergy`. */
export function shapeExponent(model: CompiledModel, beta: number): number {
  return beta * shapeExponentRate(model, beta)
}

/** d(shapeExponent)/d(beta), K. */
export function shapeExponentRate(model: CompiledModel, beta: number): number {
  return model.kind === 'background' && beta >= model.backgroundBeta ? model.lowestBelow : 0
}

/** phi = e^{-e beta} */
function evaluatePlain({ lineCount, starts, amplitude, energy }: CompiledModel, beta: number, { value, first, second }: Shapes): void {
  for (let i = 0; i < lineCount; i++) {
    let f = 0, d = 0, dd = 0
    for (let c = starts[i]; c < starts[i + 1]; c++) {
      const e = energy[c]
      const p = amplitude[c] * Math.exp(-e * beta)
      f += p
      d -= e * p
      dd += e * e * p
    }
    value[i] = f
    first[i] = d
    second[i] = dd
  }
}

/** phi = e^{-e beta} g, g = 1 - e^{-v beta} */
function evaluateStimulated({ lineCount, starts, amplitude, energy, photon }: CompiledModel, beta: number, out: Shapes): void {
  for (let i = 0; i < lineCount; i++) {
    clear(out, i)
    for (let c = starts[i]; c < starts[i + 1]; c++) {
      const v = photon[c]
      const g = -Math.expm1(-v * beta)
      const u = Math.exp(-v * beta)
      addProduct(out, i, amplitude[c] * Math.exp(-energy[c] * beta), energy[c], g, v * u, -v * v * u)
    }
  }
}

/** T > T_bg: phi = e^{-e beta} g, g = (1 - e^{-v (b - beta)}) / (1 - e^{-v b}), b = 1/T_bg; the same function as in the table, without cancellation. */
function evaluateAboveBackground({ lineCount, starts, amplitude, energy, photon, backgroundBeta }: CompiledModel, beta: number, out: Shapes): void {
  for (let i = 0; i < lineCount; i++) {
    clear(out, i)
    for (let c = starts[i]; c < starts[i + 1]; c++) {
      const v = photon[c]
      const t = -v * (backgroundBeta - beta)
      const d = Math.expm1(-v * backgroundBeta)
      const u = Math.exp(t) / d
      addProduct(out, i, amplitude[c] * Math.exp(-energy[c] * beta), energy[c], Math.expm1(t) / d, v * u, v * v * u)
    }
  }
}

/** T <= T_bg: phi = e^{-(e - v) beta} g, g = (e^{v (b - beta)} - 1) / (e^{v b} - 1) <= 0, with the lowest e - v subtracted. */
function evaluateBelowBackground({ lineCount, starts, amplitude, energy, photon, backgroundBeta, lowestBelow }: CompiledModel, beta: number, out: Shapes): void {
  for (let i = 0; i < lineCount; i++) {
    clear(out, i)
    for (let c = starts[i]; c < starts[i + 1]; c++) {
      const v = photon[c]
      const e = energy[c] - v - lowestBelow
      const t = v * (backgroundBeta - beta)
      const d = Math.expm1(v * backgroundBeta)
      const u = Math.exp(t) / d
      addProduct(out, i, amplitude[c] * Math.exp(-e * beta), e, Math.expm1(t) / d, -v * u, v * v * u)
    }
  }
}

function clear({ value, first, second }: Shapes, i: number): void {
  value[i] = 0
  first[i] = 0
  second[i] = 0
}

/** Adds p e^{-e beta} g and its derivatives; p already holds the exponential. */
function addProduct({ value, first, second }: Shapes, i: number, p: number, e: number, g: number, g1: number, g2: number): void {
  value[i] += p * g
  first[i] += p * (g1 - e * g)
  second[i] += p * (g2 - 2 * e * g1 + e * e * g)
}
