import { fitTable } from '../retrieve/fit-table'
import type { TableFit } from '../retrieve/fit-table'
import { subTable } from '../retrieve/line-table'
import { chiSquareTail } from '../statistics/chi-square'
import type { RetrievalResult } from '../types'

type ByBand = RetrievalResult['byBand']

/** T of each band by itself; empty for one band. With relative noise the uncertainty uses the factor of the joint fit. */
export function temperatureByBand(fitted: TableFit): ByBand {
  const names = [...new Set(fitted.table.lines.map(line => line.band))]
  if (names.length < 2) return []
  return names.map((band) => {
    const keep = fitted.table.lines.flatMap((line, i) => line.band === band ? i : [])
    const alone = keep.length > 1 ? fitTable(subTable(fitted.table, keep)) : null
    if (!alone || alone.temperature === null || fitted.varianceFactor === null) return { band, temperature: null, uNoise: null }
    return { band, temperature: alone.temperature, uNoise: Math.sqrt(alone.fit.covariance[0] * fitted.varianceFactor) / alone.fit.beta ** 2 }
  })
}

/** chi2 of the bands' beta about their weighted mean, bands taken as independent; undefined below two bands with a temperature. */
export function bandAgreement(byBand: ByBand): RetrievalResult['bandAgreement'] {
  const points = byBand.flatMap(({ temperature, uNoise }) => temperature !== null && uNoise ? { beta: 1 / temperature, u: uNoise / temperature ** 2 } : [])
  if (points.length < 2) return undefined
  const weight = points.reduce((sum, { u }) => sum + u ** -2, 0)
  const mean = points.reduce((sum, { beta, u }) => sum + beta * u ** -2, 0) / weight
  const chi2 = points.reduce((sum, { beta, u }) => sum + ((beta - mean) / u) ** 2, 0)
  const dof = points.length - 1
  return { chi2, dof, pValue: chiSquareTail(chi2, dof) }
}
