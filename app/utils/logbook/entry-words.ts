import type { LogbookView } from '#shared/schemas/logbook'
import { changesIn, remarksIn, type ChangeWords } from '~/utils/logbook/changes'
import { deedWords, nounOf, peopleDeeds, wordsOf } from '~/utils/logbook/deeds'
import { timeText } from '~/utils/time-text'

export interface EntryWords {
  id: string
  when: string
  who: string
  deed: string
  /** The whole sentence after the name, for deeds among people; null: it is made of what follows. */
  whole: string | null
  noun: string
  /** Name and page of what it was done to; the name is null when that is gone. */
  name: string | null
  to: string | null
  remarks: string[]
  changes: ChangeWords[]
  /** How many such deeds in a row this stands for. */
  count: number
}

const objectPages: Record<string, string> = { station: 'stations', instrument: 'instruments', recipe: 'recipes' }

/** Where the thing can be looked at. */
function pageOf({ kind, id, address }: LogbookView['object'], campaign: string | null): string | null {
  if (kind === 'retrieval') return `/retrievals/${id}`
  if (kind === 'campaign') return address && `/campaigns/${address}`
  const folder = objectPages[kind]
  return folder && campaign && address ? `/campaigns/${campaign}/${folder}/${address}` : null
}

export const entryWords = (entry: LogbookView, campaign: string | null): EntryWords => ({
  id: entry.id,
  when: timeText(entry.at),
  who: entry.actor ?? 'Trotline',
  deed: deedWords[entry.action] ?? wordsOf(entry.action),
  whole: peopleDeeds[entry.action]?.(entry.detail) ?? null,
  noun: nounOf(entry.object.kind),
  // What was deleted has its name in the entry alone.
  name: entry.object.name ?? (typeof entry.detail.name === 'string' ? entry.detail.name : null),
  to: pageOf(entry.object, campaign),
  remarks: remarksIn(entry.detail),
  changes: changesIn(entry),
  count: 1,
})

/** Of these there come hundreds at once. */
const manyAtOnce = ['retrieval', 'spectrum']
const alike = (a: EntryWords, b: EntryWords) => manyAtOnce.includes(a.noun) && a.who === b.who && a.deed === b.deed && a.noun === b.noun && a.when === b.when
  && a.changes.length + b.changes.length === 0 && a.remarks.join() === b.remarks.join()

/** Deeds of one person within the same minute that differ only in their object are told in one line: a batch of a thousand is one deed. */
export function inBursts(entries: EntryWords[]): EntryWords[] {
  const told: EntryWords[] = []
  for (const entry of entries) {
    const last = told.at(-1)
    if (last && alike(last, entry)) told[told.length - 1] = { ...last, count: last.count + 1 }
    else told.push(entry)
  }
  return told
}
