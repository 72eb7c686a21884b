import { shallowRef } from 'vue'
import { describe, expect, it } from 'vitest'
import { useFileReading } from '~/composables/useFileReading'
import { useIdempotencyKey } from '~/composables/useIdempotencyKey'
import { useSending } from '~/composables/useSending'
import { newEntry, type FileEntry } from '~/utils/submit/entries'
import { tasks } from '~/workers/tasks'
import type { EngineTasks, TaskName } from '~/workers/protocol'

const entry = (id: number, over: Partial<FileEntry> = {}): FileEntry => ({ ...newEntry(id, new File([`${id}`], `s${id}.csv`)), state: 'ready', ...over })
type Sent = { names: string[], about: object }

function sending(list: FileEntry[], answer: (sent: Sent, call: number) => { ok: boolean }[]) {
  const entries = shallowRef(list)
  const calls: Sent[] = []
  const upload = async (_: string, files: File[], about: object) => {
    const sent = { names: files.map(file => file.name), about }
    calls.push(sent)
    return { items: answer(sent, calls.length).map(({ ok }, index) => ({ name: sent.names[index]!, ok, ...(ok ? { id: `id-${sent.names[index]}` } : { error: { code: 'x', message: 'not a spectrum' } }), missing: [], warnings: [] })) }
  }
  const patch = (id: number, change: Partial<FileEntry>) => { entries.value = entries.value.map(one => (one.id === id ? { ...one, ...change } : one)) }
  return { entries, calls, ...useSending({ entries, patch, upload }) }
}
const fine = ({ names }: Sent) => names.map(() => ({ ok: true }))

describe('sending files', () => {
  it('sends files with different answers in different requests', async () => {
    const { calls, send } = sending([entry(1, { answers: { medium: 'air' } }), entry(2, { answers: { medium: 'vacuum' } }), entry(3, { answers: { medium: 'air' } })], fine)
    await send('ridge', { station: 'north' })
    expect(calls).toEqual([{ names: ['s1.csv', 's3.csv'], about: { station: 'north', medium: 'air' } }, { names: ['s2.csv'], about: { station: 'north', medium: 'vacuum' } }])
  })

  it('gives ids in the order of the list', async () => {
    const { send } = sending([entry(1, { answers: { medium: 'air' } }), entry(2), entry(3, { answers: { medium: 'air' } })], fine)
    expect(await send('ridge', {})).toEqual(['id-s1.csv', 'id-s2.csv', 'id-s3.csv'])
  })

  it('keeps what was stored when a later request fails, and sends only the rest again', async () => {
    const many = Array.from({ length: 60 }, (_, index) => entry(index + 1))
    const { calls, entries, send } = sending(many, (sent, call) => {
      if (call === 2) throw new Error('The server could not be reached.')
      return fine(sent)
    })
    await expect(send('ridge', {})).rejects.toThrow('could not be reached')
    expect(entries.value.filter(one => one.state === 'stored')).toHaveLength(50)
    expect(await send('ridge', {})).toHaveLength(60)
    expect(calls.map(call => call.names.length)).toEqual([50, 10, 10])
  })

  it('leaves a file that the service refuses out and says why', async () => {
    const { entries, send } = sending([entry(1), entry(2)], () => [{ ok: false }, { ok: true }])
    expect(await send('ridge', {})).toEqual(['id-s2.csv'])
    expect(entries.value[0]).toMatchObject({ state: 'refused', error: 'not a spectrum' })
  })
})

describe('an idempotency key', () => {
  it('stays for the same body and changes with it', () => {
    const keyOf = useIdempotencyKey()
    const first = keyOf({ spectrumIds: ['a'] })
    expect(first).toMatch(/^[0-9a-f]{32}$/)
    expect(keyOf({ spectrumIds: ['a'] })).toBe(first)
    expect(keyOf({ spectrumIds: ['b'] })).not.toBe(first)
  })
})

describe('reading chosen files', () => {
  const ask = <N extends TaskName>(task: N, question: EngineTasks[N]['ask']) => tasks[task](question) as Promise<EngineTasks[N]['answer']>
  const csv = (name: string, text = 'wavelength (nm),counts\n1,2\n2,3\n3,4\n4,5\n5,6\n') => new File([text], name, { lastModified: 1 })

  it('reads each and selects the first', async () => {
    const files = useFileReading(ask)
    await files.add([csv('a.csv'), csv('b.csv', 'nothing here')])
    expect(files.entries.value.map(one => one.state)).toEqual(['ready', 'unreadable'])
    expect(files.selected.value?.name).toBe('a.csv')
  })
  it('takes the same file once and no more than a thousand', async () => {
    const files = useFileReading(ask)
    await files.add([csv('a.csv'), csv('a.csv')].slice(0, 1))
    await files.add([csv('a.csv')])
    expect(files.entries.value).toHaveLength(1)
    await files.add(Array.from({ length: 1001 }, (_, index) => csv(`n${index}.csv`)))
    expect(files.entries.value).toHaveLength(1000)
    expect(files.refusal.value).toContain('2 were left out')
  })
  it('reads a file again when its columns are answered', async () => {
    const files = useFileReading(ask)
    await files.add([csv('c.txt', '1 10 100\n2 11 110\n3 12 120\n4 13 130\n5 14 140\n')])
    await files.answer(files.selected.value!.id, { columns: { axis: 0, values: 2, sigma: null } }, false)
    expect(files.selected.value!.read!.valueTo).toBe(140)
  })
})
