import { describe, expect, it } from 'vitest'
import { airShiftWords, unitOptions } from '~/utils/submit/axis-meaning'
import { firstRows } from '~/utils/submit/first-rows'

describe('what an axis would mean', () => {
  it('shows the ends in nanometres under each unit', () => {
    const hints = Object.fromEntries(unitOptions(15857.886, 16434.696).map(option => [option.value, option.hint]))
    expect(hints.angstrom).toBe('1585.8–1643.5 nm')
    expect(hints['cm-1']).toBe('608.47–630.6 nm')
    expect(hints.nm).toBe('')
  })
  it('says how far air moves a line there', () => {
    // 0.437 nm at 1600 nm, 0.417 at 1524: computed for the design from Ciddor 1996.
    expect(airShiftWords(1599, 1601, 'nm')).toBe('At 1600.0 nm the two differ by 0.437 nm.')
    expect(airShiftWords(1, 2, 'GHz')).toBeNull()
    expect(airShiftWords(1, 2, null)).toBeNull()
  })
})

describe('firstRows', () => {
  it('skips headings and comments and takes rows of numbers', () => {
    expect(firstRows('# night 3\nwavelength,counts\n1.5,2\n1.6,3\n\n1.7,4\n1.8,5\n1.9,6')).toEqual([[1.5, 2], [1.6, 3], [1.7, 4], [1.8, 5]])
  })
  it('reads rows parted by spaces or semicolons', () => {
    expect(firstRows('1 2 3\n4;5')).toEqual([[1, 2, 3], [4, 5]])
  })
})
