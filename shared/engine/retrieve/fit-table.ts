import { createProfile, fitProfile } from '../envelope/fit-envelope'
import type { EnvelopeFit } from '../envelope/fit-envelope'
import type { ChiSquareProfile, EnvelopeProblem } from '../envelope/problem'
import { cholesky } from '../linalg/cholesky'
import { compileModel } from '../line-model/compiled-model'
import type { LineTable } from './line-table'

/** An envelope fit of a table, with what its interval and diagnostics need. */
export interface TableFit {
  table: LineTable
  profile: ChiSquareProfile
  fit: EnvelopeFit
  /** Names of the scale groups. */
  bands: string[]
  /** Lines minus unknowns; negative when the fit is under-determined. */
  dof: number
  /** Factor from the stated covariance to the real one: 1, or chi2/dof; null when noise is relative and dof is 0. */
  varianceFactor: number | null
  /** T, K; null when the fit failed. */
  temperature: number | null
  /** Fisher standard uncertainties of beta (1/K) and T (K); null when unknown. */
  uBeta: number | null
  uTemperature: number | null
}

/** Fits a table; null when its covariance is not positive definite. */
export function fitTable(table: LineTable): TableFit | null {
  const problem = problemOf(table)
  if (!problem) return null
  const profile = createProfile(problem)
  const fit = fitProfile(profile)
  const dof = table.lines.length - 1 - problem.bandCount
  const varianceFactor = table.noise === 'absolute' ? 1 : dof > 0 ? fit.chi2 / dof : null
  const solved = fit.converged && dof >= 0
  const uBeta = solved && varianceFactor !== null ? Math.sqrt(fit.covariance[0] * varianceFactor) : null
  return {
    table, profile, fit, dof, varianceFactor,
    bands: scaleGroups(table),
    temperature: solved ? 1 / fit.beta : null,
    uBeta,
    uTemperature: uBeta === null ? null : uBeta / fit.beta ** 2,
  }
}

/** Names of the scale groups in order of first appearance. */
export function scaleGroups(table: LineTable): string[] {
  return table.bandScales === 'common' ? ['all'] : [...new Set(table.lines.map(line => line.band))]
}

function problemOf(table: LineTable): EnvelopeProblem | null {
  const groups = scaleGroups(table)
  const factor = table.covariance ? cholesky(table.covariance, table.lines.length) : null
  if (table.covariance && !factor) return null
  const index = new Map(groups.map((name, i) => [name, i]))
  return {
    model: compileModel(table.lines, table.reading),
    intensity: table.intensity,
    inverseSigma: table.sigma.map(sigma => 1 / sigma),
    factor,
    band: Int32Array.from(table.lines, line => table.bandScales === 'common' ? 0 : index.get(line.band)!),
    bandCount: groups.length,
    betaRange: table.betaRange,
  }
}
