import { minimiseSquares } from '#shared/engine/optimise/minimise-squares'
import type { LeastSquaresResult } from '#shared/engine/optimise/types'
import { nistNames, readNistDataset } from '../../nist-strd/dataset'
import type { NistDataset } from '../../nist-strd/dataset'
import { nistModels } from '../../nist-strd/models'
import { fewestDigits } from '../digits'
import type { Check, Section } from '../report'

const derivatives = ['analytic', 'differences'] as const
type Derivatives = (typeof derivatives)[number]

/** From the second start; parameters and standard deviations. */
const bars: Record<Derivatives, [parameters: number, deviations: number]> = { analytic: [8, 8], differences: [7, 6] }
/** First starts from which 6 digits or an honest "not converged" is enough. */
const hardStarts = ['BoxBOD', 'MGH10']
/** The certified values have eleven digits. */
const certifiedDigits = 11

export function fitNist(dataset: NistDataset, start: 0 | 1, how: Derivatives): LeastSquaresResult {
  const model = nistModels[dataset.name]
  const y = dataset.y.map(value => model.response?.(value) ?? value)
  const n = dataset.starts[start].length
  return minimiseSquares({
    residualCount: y.length,
    residuals: (b, r) => { for (let i = 0; i < y.length; i++) r[i] = model.value(b, dataset.x[i]) - y[i] },
    ...(how === 'analytic' ? { jacobian: (b: Float64Array, j: Float64Array) => { for (let i = 0; i < y.length; i++) j.set(model.gradient(b, dataset.x[i]), i * n) } } : {}),
  }, dataset.starts[start])
}

/** Fewest correct digits over the parameters, and over their standard deviations. */
export function digitsOf({ certified }: NistDataset, { value, covariance }: LeastSquaresResult): [parameters: number, deviations: number] {
  const n = value.length
  const deviations = covariance ? certified.deviations.map((_, j) => Math.sqrt(covariance[j * (n + 1)])) : certified.deviations.map(() => 0)
  return [fewestDigits(value, certified.parameters, certifiedDigits), fewestDigits(deviations, certified.deviations, certifiedDigits)]
}

function checksOf(name: string, start: 0 | 1, how: Derivatives, fit: LeastSquaresResult, [parameters, deviations]: [number, number]): Check[] {
  const hard = start === 0 && hardStarts.includes(name)
  if (hard && !fit.converged) return []
  const [barOfParameters, barOfDeviations] = hard ? [6, 6] : bars[how]
  const what = (part: string) => `${name}, start ${start + 1}, ${how}: digits of the ${part}`
  return [
    { what: what('parameters'), found: fit.converged ? parameters : 0, bar: barOfParameters, sense: 'least' },
    { what: what('standard deviations'), found: fit.converged ? deviations : 0, bar: barOfDeviations, sense: 'least' },
  ]
}

export const section: Section = {
  order: 10,
  title: 'Nonlinear least squares: NIST StRD',
  about: `The general solver (\`shared/engine/optimise\`) on the 20 nonlinear datasets of NIST's Statistical Reference Datasets, from both
starting points, with analytic derivatives and with differences, all options at their defaults. Shown is the number of correct digits
(log relative error) of the worst parameter / the worst standard deviation; the certified values have 11. Required: 8 / 8 with analytic
derivatives, 7 / 6 with differences; from the first start of BoxBOD and MGH10 6 / 6, or a result that says it did not converge.`,
  run: () => {
    const checks: Check[] = []
    const rows = nistNames.map((name) => {
      const dataset = readNistDataset(name)
      const cells = derivatives.flatMap(how => ([0, 1] as const).map((start) => {
        const fit = fitNist(dataset, start, how)
        const digits = digitsOf(dataset, fit)
        checks.push(...checksOf(name, start, how, fit, digits))
        return `${digits.map(value => value.toFixed(1)).join(' / ')} (${fit.iterations})${fit.converged ? '' : ' not converged'}`
      }))
      return [name, ...cells]
    })
    return { tables: [{ caption: 'Correct digits of parameters / standard deviations (steps)', columns: ['dataset', 'analytic, start 1', 'analytic, start 2', 'differences, start 1', 'differences, start 2'], rows }], checks }
  },
}
