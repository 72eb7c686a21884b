import { minimiseSeparable } from '#shared/engine/optimise/variable-projection'
import { readNistDataset } from '../../nist-strd/dataset'
import { nistModels } from '../../nist-strd/models'
import type { Check, Section } from '../report'
import { digitsOf } from './nist-nonlinear'

/** Indices of the parameters in which each model is linear. */
const linearParameters: Record<string, number[]> = {
  Bennett5: [0], BoxBOD: [0], DanWood: [0], Eckerle4: [0], Gauss1: [0, 2, 5], Gauss2: [0, 2, 5], Lanczos2: [0, 2, 4], Lanczos3: [0, 2, 4],
  MGH09: [0], MGH10: [0], MGH17: [0, 1, 2], Misra1a: [0], Misra1b: [0], Misra1c: [0], Misra1d: [0], Nelson: [0, 1], Rat42: [0], Thurber: [0, 1, 2, 3],
}
const starts = [0, 1] as const

/** The model's column of a linear parameter is its value with that parameter 1 and the other linear ones 0. */
function fitSeparably(name: string, start: 0 | 1) {
  const dataset = readNistDataset(name)
  const model = nistModels[name]
  const linear = linearParameters[name]
  const count = dataset.starts[0].length
  const nonlinear = Array.from({ length: count }, (_, j) => j).filter(j => !linear.includes(j))
  const withAlpha = (alpha: Float64Array, only: number) => {
    const b = new Float64Array(count)
    nonlinear.forEach((j, at) => { b[j] = alpha[at] })
    b[only] = 1
    return b
  }
  const fit = minimiseSeparable({
    data: dataset.y.map(value => model.response?.(value) ?? value),
    linearCount: linear.length,
    columns: (alpha, out) => linear.forEach((j, k) => {
      const b = withAlpha(alpha, j)
      dataset.x.forEach((x, i) => { out[i * linear.length + k] = model.value(b, x) })
    }),
    derivatives: (alpha, out) => linear.forEach((j, k) => {
      const b = withAlpha(alpha, j)
      dataset.x.forEach((x, i) => {
        const gradient = model.gradient(b, x)
        nonlinear.forEach((at, q) => { out[(i * linear.length + k) * nonlinear.length + q] = gradient[at] })
      })
    }),
  }, nonlinear.map(j => dataset.starts[start][j]))
  return { fit, digits: digitsOf(dataset, inOrder(fit, [...nonlinear, ...linear])) }
}

/** Parameters and covariance in the order of the dataset. */
function inOrder<Fit extends ReturnType<typeof minimiseSeparable>>(fit: Fit, order: number[]): Fit {
  const n = order.length
  const value = new Float64Array(n)
  const covariance = fit.covariance && new Float64Array(n * n)
  order.forEach((j, a) => {
    value[j] = fit.value[a]
    if (covariance) order.forEach((k, b) => { covariance[j * n + k] = fit.covariance![a * n + b] })
  })
  return { ...fit, value, covariance }
}

export const section: Section = {
  order: 11,
  title: 'Variable projection: NIST StRD',
  about: `The 18 of these datasets whose models are linear in some parameters, with those eliminated (Golub & Pereyra 1973, Kaufman 1975):
only the others have a start. Correct digits of the worst parameter / standard deviation; required 8 / 8 from the second start;
from the first one 8 / 8 or a result that says it did not converge.`,
  run: () => {
    const checks: Check[] = []
    const rows = Object.keys(linearParameters).map(name => [name, String(linearParameters[name].length), ...starts.map((start) => {
      const { fit, digits } = fitSeparably(name, start)
      if (fit.converged || start === 1) {
        digits.forEach((found, part) => checks.push({ what: `${name}, start ${start + 1}: digits of the ${['parameters', 'standard deviations'][part]}`, found: fit.converged ? found : 0, bar: 8, sense: 'least' }))
      }
      return `${digits.map(value => value.toFixed(1)).join(' / ')} (${fit.iterations})${fit.converged ? '' : ' not converged'}`
    })])
    return { tables: [{ caption: 'Correct digits of parameters / standard deviations (steps)', columns: ['dataset', 'linear parameters', 'start 1', 'start 2'], rows }], checks }
  },
}
