import type { EnvelopeProblem } from '../envelope/problem'
import { solveLower } from '../linalg/triangular'
import { createShapes, evaluateShapes } from '../line-model/shapes'
import type { Shapes } from '../line-model/shapes'
import type { LeastSquaresProblem } from '../optimise/types'

/**
 * Lines as the sum of a cold and a hot gas, m_i = s_cold,b f_i(beta_cold) + s_hot,b f_i(beta_hot), in units of their noise (L^-1, or 1/sigma).
 * Parameters, 2 + 2 B of them: beta_cold, beta_hot (1/K), then the cold scales by band, then the hot ones,
 * for shapes relative to the model's reference energy and strength unit.
 *
 * @example
 * const line = (E, g) => ({ label: String(E), band: 'a', components: [{ wavenumber: 1000, termUpper: E, termLower: 0, gUpper: g, gLower: 1, einsteinA: 1 }] })
 * const problem = { model: compileModel([line(0, 1), line(100, 1)], { observable: 'photon-emission' }), intensity: Float64Array.of(3, 2), inverseSigma: Float64Array.of(10, 10), factor: null, band: Int32Array.of(0, 0), bandCount: 1, betaRange: [1e-4, 1] }
 * const model = new PairModel(problem)
 * model.parameterCount // => 4
 * const [cold, hot] = model.intensities(Float64Array.of(1 / 50, 1 / 200, 2, 1))
 * cold[1] / cold[0] // => Math.exp(-C2 * 100 / 50)
 * hot[0] // => 1
 */
export class PairModel {
  readonly lineCount: number
  readonly bandCount: number
  private readonly shapes: [Shapes, Shapes]
  private readonly column: Float64Array

  constructor(readonly problem: EnvelopeProblem) {
    this.lineCount = problem.model.lineCount
    this.bandCount = problem.bandCount
    this.shapes = [createShapes(this.lineCount), createShapes(this.lineCount)]
    this.column = new Float64Array(this.lineCount)
  }

  get parameterCount(): number {
    return 2 + 2 * this.bandCount
  }

  /** Multiplies a vector over lines by L^-1 or 1/sigma, in place. */
  whiten(vector: Float64Array): Float64Array {
    const { factor, inverseSigma } = this.problem
    if (factor) return solveLower(factor, this.lineCount, vector, vector)
    for (let i = 0; i < vector.length; i++) vector[i] *= inverseSigma[i]
    return vector
  }

  /** Whitened f(beta) of one band, zero for the lines of others. */
  bandColumn(beta: number, band: number): Float64Array {
    const shapes = this.shapes[0]
    evaluateShapes(this.problem.model, beta, shapes)
    return this.whiten(shapes.value.map((value, i) => this.problem.band[i] === band ? value : 0))
  }

  /** Model intensities (not whitened) of the cold and the hot gas. */
  intensities(parameters: Float64Array): [Float64Array, Float64Array] {
    this.evaluate(parameters)
    const part = (gas: 0 | 1) => this.shapes[gas].value.map((value, i) => value * this.scale(parameters, gas, i))
    return [part(0), part(1)]
  }

  /** Residuals (data - model) / noise and their derivatives, for data in the unit of the intensities. */
  leastSquares(intensity: Float64Array): LeastSquaresProblem {
    return {
      residualCount: this.lineCount,
      residuals: (parameters, out) => {
        this.evaluate(parameters)
        const [cold, hot] = this.shapes
        for (let i = 0; i < out.length; i++) out[i] = intensity[i] - this.scale(parameters, 0, i) * cold.value[i] - this.scale(parameters, 1, i) * hot.value[i]
        this.whiten(out)
      },
      jacobian: (parameters, out) => {
        this.evaluate(parameters)
        for (let j = 0; j < this.parameterCount; j++) this.fillSlope(parameters, j, out)
      },
    }
  }

  private evaluate(parameters: Float64Array): void {
    evaluateShapes(this.problem.model, parameters[0], this.shapes[0])
    evaluateShapes(this.problem.model, parameters[1], this.shapes[1])
  }

  private scale(parameters: Float64Array, gas: 0 | 1, line: number): number {
    return parameters[2 + gas * this.bandCount + this.problem.band[line]]
  }

  private fillSlope(parameters: Float64Array, j: number, out: Float64Array): void {
    const { column, bandCount, parameterCount, problem } = this
    const gas = j < 2 ? j as 0 | 1 : j < 2 + bandCount ? 0 : 1
    const { value, first } = this.shapes[gas]
    const band = j - 2 - gas * bandCount
    for (let i = 0; i < column.length; i++) {
      if (j < 2) column[i] = -this.scale(parameters, gas, i) * first[i]
      else column[i] = problem.band[i] === band ? -value[i] : 0
    }
    this.whiten(column)
    for (let i = 0; i < column.length; i++) out[i * parameterCount + j] = column[i]
  }
}
