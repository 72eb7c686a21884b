import { describe, expect, it } from 'vitest'
import { isComplete, knownAbout, missingOf, newEntry, othersLacking, withAnswer, type FileEntry, type ReadSummary } from '~/utils/submit/entries'
import { entryWords, queueLabel, whatIsLeft } from '~/utils/submit/entry-words'

const read: ReadSummary = {
  format: 'fits', pixelCount: 1024, axisFrom: 15858, axisTo: 16435, valueFrom: 0, valueTo: 9, hasSigma: false,
  columnNames: [], firstRows: [], stated: {}, warnings: [],
}
const entry = (id: number, over: Partial<FileEntry> = {}): FileEntry => ({ ...newEntry(id, new File(['x'], `s${id}.fits`)), state: 'ready', read, ...over })

describe('missingOf', () => {
  it('asks for unit, medium and kind of value when the file states none', () => {
    expect(missingOf(entry(1))).toEqual(['axisUnit', 'medium', 'valueKind'])
  })
  it('asks no medium for a frequency axis', () => {
    expect(missingOf(entry(1, { answers: { axisUnit: 'GHz' } }))).toEqual(['valueKind'])
  })
  it('asks for columns of a text file that does not name them', () => {
    expect(missingOf(entry(1, { read: { ...read, format: 'text' } }))[0]).toBe('columns')
  })
  it('asks nothing of a file that could not be read', () => {
    expect(missingOf(entry(1, { read: null, state: 'unreadable' }))).toEqual([])
    expect(isComplete(entry(1, { read: null, state: 'unreadable' }))).toBe(false)
  })
})

describe('withAnswer', () => {
  const files = [entry(1), entry(2), entry(3, { read: { ...read, stated: { axisUnit: 'nm' } } })]
  it('answers one file only', () => {
    const after = withAnswer(files, 1, { axisUnit: 'angstrom' }, false)
    expect(after.map(file => knownAbout(file).axisUnit)).toEqual(['angstrom', undefined, 'nm'])
  })
  it('answers every file that lacks the same and leaves what others state', () => {
    const after = withAnswer(files, 1, { axisUnit: 'angstrom' }, true)
    expect(after.map(file => knownAbout(file).axisUnit)).toEqual(['angstrom', 'angstrom', 'nm'])
  })
  it('changes an earlier answer of the file itself', () => {
    const once = withAnswer(files, 1, { medium: 'air' }, false)
    expect(knownAbout(withAnswer(once, 1, { medium: 'vacuum' }, false)[0]!).medium).toBe('vacuum')
  })
  it('counts the others that lack a field', () => {
    expect(othersLacking(files, 1, 'axisUnit')).toBe(1)
    expect(othersLacking(files, 1, 'medium')).toBe(2)
  })
})

describe('words about files', () => {
  it('says what a file still asks', () => expect(entryWords(entry(1))).toBe('asks: axis unit, air or vacuum, photons or energy'))
  it('counts in the singular and the plural', () => {
    expect(queueLabel(1)).toBe('Queue 1 retrieval')
    expect(queueLabel(1000)).toBe('Queue 1000 retrievals')
  })
  it('says what is left before the files can be queued', () => {
    expect(whatIsLeft([])).toContain('Choose files')
    expect(whatIsLeft([entry(1), entry(2)])).toBe('2 files still ask something.')
    expect(whatIsLeft([entry(1, { answers: { axisUnit: 'angstrom', medium: 'vacuum', valueKind: 'photons' } })])).toBeNull()
    expect(whatIsLeft([entry(1, { state: 'unreadable', read: null })])).toBe('None of these files can be read.')
  })
})
