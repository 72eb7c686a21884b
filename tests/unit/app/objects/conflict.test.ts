import { describe, expect, it } from 'vitest'
import { conflictRows, settle } from '~/utils/objects/conflict'
import { stationFields } from '~/utils/objects/station-fields'

const base = { slug: 'ridge', name: 'Ridge', latitude: 61, longitude: 9, altitude: null }
const mine = { ...base, name: 'My ridge', latitude: 62 }
const now = { ...base, name: 'Their ridge', altitude: 1130 }

describe('two states of one row', () => {
  const rows = conflictRows(stationFields, { base, mine, now })

  it('are laid side by side in words, where they differ', () => {
    expect(rows.map(({ label, mine: written, now: stands }) => [label, written, stands])).toEqual([
      ['Name', 'My ridge', 'Their ridge'], ['Latitude', '62 °', '61 °'], ['Altitude', 'not stated', '1130 m'],
    ])
  })

  it('leave to the person only what both changed', () => {
    expect(rows.map(({ path, both, keep }) => [path, both, keep])).toEqual([['name', true, 'mine'], ['latitude', false, 'mine'], ['altitude', false, 'now']])
  })

  it('become one by the choices', () => {
    expect(settle(rows, mine, now)).toEqual({ ...base, name: 'My ridge', latitude: 62, altitude: 1130 })
    expect(settle(rows.map(row => ({ ...row, keep: 'now' as const })), mine, now)).toEqual(now)
    expect(settle(rows.map(row => ({ ...row, keep: 'mine' as const })), mine, now)).toEqual(mine)
  })

  it('that are the same leave nothing to choose', () => {
    expect(conflictRows(stationFields, { base, mine: now, now })).toEqual([])
  })
})
