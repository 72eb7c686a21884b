import type { TableFit } from '../retrieve/fit-table'
import type { CrossCheck } from '../types'
import { plotPoints } from './plot-points'
import { fitStraightLine } from './straight-line'
import type { StraightLine } from './straight-line'

/** Estimator 2 beside the envelope fit: the straight line of the Boltzmann plot, for comparison only. */
export function boltzmannPlotCheck(fitted: TableFit): CrossCheck {
  const line = selfConsistentLine(fitted)
  const solved = line !== null && line.beta > 0
  const temperature = solved ? 1 / line.beta : null
  return {
    method: 'boltzmann-plot',
    temperature,
    uncertainty: solved ? line.uBeta / line.beta ** 2 : null,
    interval: null,
    note: noteOf(fitted, line),
  }
}

/** Where phi is more than an exponential the plot is redrawn at its own temperature until that stands still. */
function selfConsistentLine({ table, fit, profile, varianceFactor }: TableFit): StraightLine | null {
  const noise = Math.sqrt(varianceFactor ?? 0)
  const plain = profile.problem.model.kind === 'plain'
  let beta = plain ? 0 : fit.beta
  let line = fitStraightLine(plotPoints(table, beta, noise))
  for (let round = 0; !plain && round < 50 && line && line.beta > 0; round++) {
    const moved = Math.abs(line.beta - beta)
    beta = line.beta
    if (moved <= 1e-12 * beta) break
    line = fitStraightLine(plotPoints(table, beta, noise))
  }
  return line
}

function noteOf({ table }: TableFit, line: StraightLine | null): string {
  if (!line) return 'fewer than two lines stand above three sigma'
  if (!(line.beta > 0)) return 'the straight line does not fall with energy'
  const all = table.lines.length
  return `straight line through ln(I/w) of ${all} lines without those at or below three sigma; biased up or down at low signal-to-noise`
}
