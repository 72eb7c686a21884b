import type { Fact } from '~/utils/result/facts'
import type { FileEntry } from './entries'
import { knownAbout } from './entries'
import { unitNames } from './axis-meaning'

const formats = { text: 'text table', fits: 'FITS image, one axis', json: 'JSON spectrum' } as const

/** What the browser read in a file, in words; what is not known is left to the questions. */
export function fileFacts(entry: FileEntry): Fact[] {
  const { read } = entry
  if (!read) return []
  const about = knownAbout(entry)
  const unit = about.axisUnit ? unitNames[about.axisUnit] : 'unit not known'
  const facts: Fact[] = [
    { name: 'what it is', value: `${formats[read.format]}, ${read.pixelCount} pixels${read.hasSigma ? ', with uncertainties' : ', no uncertainties'}` },
    { name: 'axis', value: `${read.axisFrom} to ${read.axisTo}, ${unit}${about.medium ? `, in ${about.medium}` : ''}` },
    { name: 'values', value: `${read.valueFrom.toPrecision(4)} to ${read.valueTo.toPrecision(4)}${about.valueUnit ? ` ${about.valueUnit}` : ''}${about.valueKind ? `, ${about.valueKind}` : ''}` },
    { name: 'observed', value: about.observedAt ? `${about.observedAt.slice(0, 19).replace('T', ' ')} UTC` : 'the file states no time' },
  ]
  if (read.columnNames.length && about.columns) {
    const { axis, values, sigma } = about.columns
    const name = (column: number) => read.columnNames[column] ?? `column ${column + 1}`
    facts.splice(1, 0, { name: 'columns', value: `axis ${name(axis)}, values ${name(values)}${sigma === null ? '' : `, uncertainty ${name(sigma)}`}` })
  }
  return facts
}
