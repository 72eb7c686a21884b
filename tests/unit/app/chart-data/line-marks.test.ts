import { describe, expect, it } from 'vitest'
import { lineMarks, nearestMark } from '~/utils/chart-data/line-marks'

const at = (nm: number, label: string) => ({ label, band: '4-2', wavenumber: 1e7 / nm, used: true })

describe('lineMarks', () => {
  it('turns wavenumber into vacuum wavelength and keeps only what is in range', () => {
    const marks = lineMarks([at(1600, 'a'), at(1700, 'out')], [1590, 1650])
    expect(marks).toHaveLength(1)
    expect(marks[0]!.x).toBeCloseTo(1600, 9)
  })
  it('puts labels that would touch in different rows', () => {
    const rows = lineMarks([at(1600, 'a'), at(1601, 'b'), at(1620, 'c')], [1590, 1650]).map(mark => mark.row)
    expect(rows).toEqual([0, 1, 0])
  })
})

describe('nearestMark', () => {
  const marks = lineMarks([at(1600, 'a'), at(1610, 'b')], [1590, 1650])
  it('is the closest line near the pointer', () => expect(nearestMark(marks, 1609.4, [1590, 1650])?.label).toBe('b'))
  it('is none far from every line', () => expect(nearestMark(marks, 1640, [1590, 1650])).toBeNull())
})
