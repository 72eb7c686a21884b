import { missingFields, nothingSaid } from '#shared/formats/merge-about'
import { impliesVacuum } from '#shared/formats/units'
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
  /** What the chosen instrument says of all its spectra. */
  common: Partial<SpectrumAbout>
  error: string | null
  spectrumId: string | null
  /** What the service said of the stored file. */
  remarks: string[]
}

export const newEntry = (id: number, file: File): FileEntry =>
  ({ id, file, name: file.name, size: file.size, state: 'waiting', read: null, answers: {}, common: {}, error: null, spectrumId: null, remarks: [] })

/** What is known of a file: what its instrument says, over it what the file states, over it what a person answers. */
export function knownAbout(entry: Pick<FileEntry, 'read' | 'answers' | 'common'>): Partial<SpectrumAbout> {
  return { ...entry.common, ...spoken(entry.read?.stated), ...entry.answers }
}

const spoken = (stated: Partial<SpectrumAbout> = {}): Partial<SpectrumAbout> =>
  Object.fromEntries(Object.entries(stated).filter(([, value]) => value !== null && value !== undefined))

/** What still has to be asked, in the order of asking, by the same rule as the service. */
export function missingOf(entry: Pick<FileEntry, 'read' | 'answers' | 'common'>): MissingField[] {
  if (!entry.read) return []
  const about = { ...nothingSaid, ...knownAbout(entry) }
  if (about.medium === null && impliesVacuum(about.axisUnit)) about.medium = 'vacuum'
  return missingFields(about, entry.read.format !== 'text' || about.columns !== null)
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

/** The questions to show: what neither the file nor its instrument says, answered or not, so that an answer can be changed. */
export function questionsOf(entry: FileEntry): MissingField[] {
  // The unit that was answered decides whether there is a medium to ask.
  const asksMedium = missingOf({ ...entry, answers: { ...entry.answers, medium: null } }).includes('medium')
  return missingOf({ ...entry, answers: {} }).filter(field => field !== 'medium' || asksMedium)
}
