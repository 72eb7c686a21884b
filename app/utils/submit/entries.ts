import type { MissingField, SpectrumAbout } from '#shared/types/spectrum'

/** What the browser found in one file: small enough to keep for a thousand files. */
export interface ReadSummary {
  format: 'text' | 'fits' | 'json'
  pixelCount: number
  axisFrom: number
  axisTo: number
  valueFrom: number
  valueTo: number
  hasSigma: boolean
  columnNames: string[]
  /** First rows as numbers, for the question about columns. */
  firstRows: number[][]
  stated: Partial<SpectrumAbout>
  warnings: string[]
}

export type EntryState = 'waiting' | 'reading' | 'unreadable' | 'ready' | 'sending' | 'stored' | 'refused'

/** One chosen file on its way. The bytes stay in the File; only the summary is held. */
export interface FileEntry {
  id: number
  file: File
  name: string
  size: number
  state: EntryState
  read: ReadSummary | null
  answers: Partial<SpectrumAbout>
  error: string | null
  spectrumId: string | null
  /** What the service said of the stored file. */
  remarks: string[]
}

export const newEntry = (id: number, file: File): FileEntry =>
  ({ id, file, name: file.name, size: file.size, state: 'waiting', read: null, answers: {}, error: null, spectrumId: null, remarks: [] })

/** What is known of a file: what it states, then what a person says. */
export function knownAbout(entry: Pick<FileEntry, 'read' | 'answers'>): Partial<SpectrumAbout> {
  return { ...entry.read?.stated, ...entry.answers }
}

const inWavelength = new Set(['nm', 'angstrom', 'um'])

/** What still has to be asked, in the order of asking. Frequency and wavenumber need no medium. */
export function missingOf(entry: Pick<FileEntry, 'read' | 'answers'>): MissingField[] {
  if (!entry.read) return []
  const about = knownAbout(entry)
  const missing: MissingField[] = []
  if (entry.read.format === 'text' && !about.columns) missing.push('columns')
  if (!about.axisUnit) missing.push('axisUnit')
  if (!about.medium && (!about.axisUnit || inWavelength.has(about.axisUnit))) missing.push('medium')
  if (!about.valueKind) missing.push('valueKind')
  return missing
}

export const isComplete = (entry: FileEntry): boolean => entry.read !== null && entry.state !== 'unreadable' && missingOf(entry).length === 0

/** Answers for one file, and for every other file that lacks the same when `toAll` is set; stated or given answers are never overwritten in others. */
export function withAnswer(entries: FileEntry[], id: number, answer: Partial<SpectrumAbout>, toAll: boolean): FileEntry[] {
  const fields = Object.keys(answer) as (keyof SpectrumAbout)[]
  return entries.map((entry) => {
    if (entry.id === id) return { ...entry, answers: { ...entry.answers, ...answer } }
    if (!toAll || entry.state === 'stored' || entry.state === 'unreadable') return entry
    const lacking = fields.filter(field => knownAbout(entry)[field] == null)
    if (!lacking.length) return entry
    return { ...entry, answers: { ...entry.answers, ...Object.fromEntries(lacking.map(field => [field, answer[field]])) } }
  })
}

/** How many other files lack the field too. */
export const othersLacking = (entries: FileEntry[], id: number, field: MissingField): number =>
  entries.filter(entry => entry.id !== id && entry.state !== 'unreadable' && missingOf(entry).includes(field)).length
