import { missingOf, type FileEntry } from './entries'

const askedWords = { columns: 'columns', axisUnit: 'axis unit', medium: 'air or vacuum', valueKind: 'photons or energy' } as const

/** The state of a file in a few words, for the list. */
export function entryWords(entry: FileEntry): string {
  switch (entry.state) {
    case 'waiting': return 'waits to be read'
    case 'reading': return 'reading'
    case 'unreadable': return entry.error ?? 'cannot be read'
    case 'sending': return 'sending'
    case 'stored': return 'stored'
    case 'refused': return entry.error ?? 'refused'
    case 'ready': {
      const missing = missingOf(entry)
      return missing.length ? `asks: ${missing.map(field => askedWords[field]).join(', ')}` : 'complete'
    }
  }
}

export type EntryTone = 'ok' | 'warn' | 'bad' | 'quiet'

export function entryTone(entry: FileEntry): EntryTone {
  if (entry.state === 'unreadable' || entry.state === 'refused') return 'bad'
  if (entry.state === 'stored') return 'ok'
  if (entry.state === 'ready') return missingOf(entry).length ? 'warn' : 'ok'
  return 'quiet'
}

export function queueLabel(count: number): string {
  return count === 1 ? 'Queue 1 retrieval' : `Queue ${count} retrievals`
}

/** What stands between the files and the queue, in words; null when nothing does. */
export function whatIsLeft(entries: FileEntry[]): string | null {
  if (!entries.length) return 'Choose files or paste a line table first.'
  const reading = entries.filter(entry => entry.state === 'waiting' || entry.state === 'reading').length
  if (reading) return reading === 1 ? 'One file is still being read.' : `${reading} files are still being read.`
  const open = entries.filter(entry => entry.state === 'ready' && missingOf(entry).length > 0).length
  if (open) return open === 1 ? 'One file still asks something.' : `${open} files still ask something.`
  return entries.some(entry => entry.state === 'ready' || entry.state === 'stored' || entry.state === 'refused') ? null : 'None of these files can be read.'
}
