import { choice, quantity, text, type FieldWords } from '~/utils/objects/field-words'
import { axisUnitWords, mediumWords, valueKindWords } from '~/utils/spectrum-words'

/** What is said of a spectrum, for its logbook. */
export const spectrumFields: FieldWords[] = [
  text('name', 'File'),
  text('sha256', 'SHA-256'),
  choice('axisUnit', 'Unit of the axis', axisUnitWords),
  choice('medium', 'Medium of the axis', mediumWords),
  text('airFormula', 'Formula of air'),
  choice('valueKind', 'Values count', valueKindWords),
  text('valueUnit', 'Unit of the values'),
  { path: 'columns', label: 'Columns', words: columnWords },
  text('observedAt', 'Observed at'),
  quantity('exposureSeconds', 'Exposure', 's'),
  text('station', 'Station', 'none'),
  text('instrument', 'Instrument', 'none'),
  quantity('fullScale', 'Full scale', ''),
]

/** Columns are counted from one, as people do. */
function columnWords(value: unknown): string {
  const columns = value as { axis: number, values: number, sigma: number | null } | null | undefined
  if (!columns) return 'not stated'
  return [`axis ${columns.axis + 1}`, `values ${columns.values + 1}`, columns.sigma === null ? 'no sigma' : `sigma ${columns.sigma + 1}`].join(', ')
}
