import { solveLowerTransposed } from '../linalg/triangular'
import type { TableFit } from '../retrieve/fit-table'
import type { WhitenedFit } from './whitened-fit'

/** Leverage and standardised residual of one line. */
export interface LineResidual {
  /** Diagonal of the hat matrix J (J^T C^-1 J)^-1 J^T C^-1: 0 .. 1 for independent lines. */
  leverage: number
  /** (intensity - model) over its own expected spread; null where the fit leaves it none. */
  residual: number | null
}

/** A residual whose expected variance is below this share of the line's is fitted exactly. */
const spreadFloor = 1e-9

/** Leverage and residuals of every line: cov(r) = C - J (J^T C^-1 J)^-1 J^T (Cook & Weisberg 1982, 2.1). */
export function lineResiduals(fitted: TableFit, white: WhitenedFit): LineResidual[] {
  const { table, varianceFactor } = fitted
  const n = table.lines.length
  const factor = fitted.profile.problem.factor
  // Columns of L Q and of L^-T Q; for independent lines sigma q and q / sigma.
  const spread = white.basis.map(q => factor ? timesLower(factor, n, q) : q.map((value, i) => value * table.sigma[i]))
  const dual = white.basis.map(q => factor ? solveLowerTransposed(factor, n, q) : q.map((value, i) => value / table.sigma[i]))
  return table.lines.map((_, i) => {
    let leverage = 0
    let explained = 0
    for (let k = 0; k < spread.length; k++) {
      leverage += spread[k][i] * dual[k][i]
      explained += spread[k][i] ** 2
    }
    const variance = table.sigma[i] ** 2
    const left = (variance - explained) * (varianceFactor ?? 0)
    const residual = variance - explained > spreadFloor * variance && left > 0 ? white.difference[i] / Math.sqrt(left) : null
    return { leverage, residual }
  })
}

function timesLower(l: Float64Array, n: number, x: Float64Array): Float64Array {
  return x.map((_, i) => {
    let sum = 0
    for (let k = 0; k <= i; k++) sum += l[i * n + k] * x[k]
    return sum
  })
}
