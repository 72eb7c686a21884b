import type { SpectrumAbout } from '../../types/spectrum'
import { checkAxis, checkPixelCount, checkSigma } from '../check-columns'
import type { FormatReading } from '../format-reading'
import { valueKindOf } from '../units'
import type { Columns } from './choose-columns'
import { chooseColumns } from './choose-columns'
import type { ColumnHeading } from './column-names'
import { parseHeading } from './column-names'
import { decodeText } from './decode-text'
import { findLayout } from './layout'
import { parseRows } from './parse-rows'

/** A spectrum from CSV, TSV, semicolon or whitespace text. Throws `FormatError`. */
export function readTextTable(bytes: Uint8Array, saidColumns?: Columns | null): FormatReading {
  const { text, warnings } = decodeText(bytes)
  const layout = findLayout(text)
  const table = parseRows(text, layout)
  checkPixelCount(table.lines.length)
  const headings = layout.names.map(parseHeading)
  const { columns, certain } = chooseColumns(table.columns, headings, saidColumns)
  const place = (row: number) => `line ${table.lines[row]}`
  const axis = table.columns[columns.axis]!
  const sigma = columns.sigma === null ? null : table.columns[columns.sigma]!
  checkAxis(axis, place)
  if (sigma) checkSigma(sigma, place)
  return {
    spectrum: {
      format: 'text',
      axis: axis.slice(),
      values: table.columns[columns.values]!.slice(),
      sigma: sigma?.slice() ?? null,
      stated: { ...statedBy(headings, columns), ...(certain ? { columns } : {}) },
      columnNames: headings.length ? headings.map(heading => heading.raw) : table.columns.map((_, index) => `column ${index + 1}`),
      warnings: [
        ...warnings,
        ...layout.warnings,
        ...(table.decimalMark === ',' ? [`Commas were read as decimal marks: the axis begins at ${axis[0]}.`] : []),
        ...(headings[columns.axis]?.conflict ? [`The heading "${headings[columns.axis]!.raw.slice(0, 60)}" names two units; neither was taken.`] : []),
      ],
    },
    proposedColumns: certain ? null : columns,
  }
}

function statedBy(headings: ColumnHeading[], columns: Columns): Partial<SpectrumAbout> {
  const axis = headings[columns.axis]
  const values = headings[columns.values]
  if (!axis || !values) return {}
  const valueKind = valueKindOf(values.unitText ?? '') ?? (/^photons?( |_|$)/.test(values.name) ? 'photons' : null)
  return {
    ...(axis.axisUnit ? { axisUnit: axis.axisUnit } : {}),
    ...(axis.medium ? { medium: axis.medium } : {}),
    ...(values.unitText ? { valueUnit: values.unitText.slice(0, 64) } : {}),
    ...(valueKind ? { valueKind } : {}),
  }
}
