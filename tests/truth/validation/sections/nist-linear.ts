import { leastSquares } from '#shared/engine/linalg/least-squares'
import { linearNames, readLinearDataset } from '../../nist-strd/linear'
import { fewestDigits } from '../digits'
import { exactLeastSquares, toNumber } from '../rational'
import type { Check, Section } from '../report'

const usualBar = 9
const bars: Record<string, number> = { wampler4: 7, wampler5: 5, filip: 7 }

/** The engine's solution beside the exact one. */
export function compareLinear(name: string) {
  const { rows, y } = readLinearDataset(name)
  const exact = exactLeastSquares(rows, y)
  const p = rows[0].length
  const fit = leastSquares(rows.flat().map(toNumber), rows.length, p, y.map(toNumber))!
  const deviation = Math.sqrt(fit.sumOfSquares / (rows.length - p))
  const errors = exact.errors.map((_, j) => deviation * Math.sqrt(fit.covariance[j * (p + 1)]))
  return { exact, parameters: fewestDigits(fit.x, exact.parameters), errors: exact.sumOfSquares === 0 ? null : fewestDigits(errors, exact.errors), deviation }
}

export const section: Section = {
  order: 12,
  title: 'Linear least squares: NIST StRD',
  about: `Householder QR (\`shared/engine/linalg\`) on 11 linear datasets, compared with the exact solution of the normal equations in
rational numbers. Correct digits of the worst parameter and of the worst standard error, 15 at most. Required: 9, except Wampler4 (7),
Wampler5 (5) and Filip (7), whose matrices amplify the rounding of the data. Wampler1 and 2 fit exactly: they have no standard error.`,
  run: () => {
    const checks: Check[] = []
    const rows = linearNames.map((name) => {
      const { parameters, errors } = compareLinear(name)
      const bar = bars[name] ?? usualBar
      checks.push({ what: `${name}: digits of the parameters`, found: parameters, bar, sense: 'least' })
      if (errors !== null) checks.push({ what: `${name}: digits of the standard errors`, found: errors, bar, sense: 'least' })
      return [name, parameters.toFixed(1), errors?.toFixed(1) ?? 'exact fit', String(bar)]
    })
    return { tables: [{ columns: ['dataset', 'parameters', 'standard errors', 'required'], rows }], checks }
  },
}
