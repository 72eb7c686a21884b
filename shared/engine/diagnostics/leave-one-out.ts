import { fitTable } from '../retrieve/fit-table'
import type { TableFit } from '../retrieve/fit-table'
import { subTable } from '../retrieve/line-table'
import { leaveOneOutExactLines } from '../thresholds'
import type { WhitenedFit } from './whitened-fit'

/** beta with one line left out, and its uncertainty with the noise of the full fit; null where the rest gives none. */
export interface LeftOut { beta: number, uBeta: number | null }

/**
 * The fit without each line in turn. Up to 64 lines each is a full fit of the others (with their own covariance);
 * above, one linearised step for independent lines (Cook & Weisberg 1982, 2.2.1), without uncertainty, and null with a full covariance.
 */
export function leaveOneOut(fitted: TableFit, white: WhitenedFit): (LeftOut | null)[] {
  const n = fitted.table.lines.length
  if (n > leaveOneOutExactLines) return linearisedSteps(fitted, white)
  return fitted.table.lines.map((_, i) => {
    const keep = Array.from({ length: n }, (_, j) => j).filter(j => j !== i)
    const without = n > 2 ? fitTable(subTable(fitted.table, keep)) : null
    if (!without || without.temperature === null) return null
    const uBeta = fitted.varianceFactor === null ? null : Math.sqrt(without.fit.covariance[0] * fitted.varianceFactor)
    return { beta: without.fit.beta, uBeta }
  })
}

function linearisedSteps(fitted: TableFit, white: WhitenedFit): (LeftOut | null)[] {
  const { table, fit } = fitted
  if (table.covariance) return table.lines.map(() => null)
  // The last basis vector is the part of the beta column that no scale can imitate: beta moves along it by residual / length.
  const direction = white.basis[white.basis.length - 1]
  const length = Math.sqrt(1 / fit.covariance[0])
  return table.lines.map((_, i) => {
    const leverage = white.basis.reduce((sum, q) => sum + q[i] ** 2, 0)
    if (leverage > 1 - 1e-9) return null
    const beta = fit.beta - direction[i] * white.residuals[i] / (length * (1 - leverage))
    return beta > 0 ? { beta, uBeta: null } : null
  })
}
