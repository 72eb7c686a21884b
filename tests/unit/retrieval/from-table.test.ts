import { describe, expect, it } from 'vitest'
import { co, fromTable, inputOf, lines, oh, p1, problemsOf } from './helpers'

const table = { observable: 'photon-emission', lineList: 'oh-meinel', band: '3-1' }

describe('a table whose lines are named from a list', () => {
  it('gets their molecular data, in the table\'s order', () => {
    const { lines: prepared, reading, noise, strengthSet } = inputOf(fromTable({ ...table, lines: lines(['P1(4)', 'P1(2)']) }))
    const known = oh.bands.find(band => band.id === '3-1')!.lines.find(line => line.label === 'P1(4)')!
    expect(prepared.map(line => line.label)).toEqual(['P1(4)', 'P1(2)'])
    expect(prepared[0]).toMatchObject({ band: '3-1', intensity: 10, sigma: 1, used: true })
    expect(prepared[0].components.map(one => [one.wavenumber, one.termUpper, one.gUpper, one.einsteinA]))
      .toEqual(known.components.map(one => [one.wavenumber, one.termUpper, one.gUpper, one.strengths.brooke2016]))
    expect([reading, noise, strengthSet]).toEqual([{ observable: 'photon-emission' }, 'absolute', 'brooke2016'])
  })

  it('takes the band from the line, the label, the table or the settings', () => {
    const bandsOf = (...given: Parameters<typeof fromTable>) => inputOf(fromTable(...given)).lines.map(line => line.band)
    expect(bandsOf({ ...table, lines: lines(p1, { band: '4-2' }) })).toEqual(Array(4).fill('4-2'))
    expect(bandsOf({ ...table, band: undefined, lines: lines(['3-1 P1(2)', '4-2 P1(2)']) })).toEqual(['3-1', '4-2'])
    expect(bandsOf({ ...table, band: undefined, lines: lines(p1) }, { bands: ['5-3'] })).toEqual(Array(4).fill('5-3'))
    expect(bandsOf({ observable: 'brightness-integral', lines: lines(['1-0', '2-1']) }, {}, co)).toEqual(['v=0', 'v=0'])
  })

  it('uses only the lines that the settings name, when they name any', () => {
    expect(inputOf(fromTable({ ...table, lines: lines(p1) }, { lines: ['P1(2)', 'P1(5)'] })).lines.map(line => line.used)).toEqual([true, false, false, true])
  })

  it('says an unknown label with its path and the labels most like it', () => {
    const [problem, ...others] = problemsOf(fromTable({ ...table, lines: [...lines(p1), { label: 'P1(22)', intensity: 1, sigma: 1 }] }))
    expect(others).toEqual([])
    expect(problem.path).toBe('lines.4.label')
    expect(problem.message).toContain('The band 3-1 of oh-meinel has no line "P1(22)"')
    expect(problem.message).toMatch(/near: .*P1\(2\)/)
  })

  it('says an unknown or a missing band, with those there are', () => {
    expect(problemsOf(fromTable({ ...table, band: '3-11', lines: lines(['P1(2)']) }))).toEqual([{ path: 'band', message: expect.stringMatching(/no band "3-11"; near: 3-1, /) }])
    expect(problemsOf(fromTable({ ...table, lines: lines(['P1(2)'], { band: 'x' }) }))[0].path).toBe('lines.0.band')
    expect(problemsOf(fromTable({ ...table, band: undefined, lines: lines(['P1(2)']) }))).toEqual([{ path: 'lines.0.band', message: expect.stringContaining('state the band') }])
  })

  it('says an unknown line list', () => {
    expect(problemsOf(fromTable({ ...table, lineList: 'none', lines: lines(p1) }, {}, null))[0]).toEqual({ path: 'lineList', message: 'There is no line list "none".' })
  })
})

describe('the strength set', () => {
  const setOf = (...given: Parameters<typeof fromTable>) => inputOf(fromTable(...given)).strengthSet

  it('is the first of the list that has every line, unless one is asked for; the table wins', () => {
    expect(setOf({ ...table, lines: lines(p1) })).toBe('brooke2016')
    expect(setOf({ ...table, band: '6-2', lines: lines(p1) })).toBe('mies1974')
    expect(setOf({ ...table, lines: lines(p1) }, { strengthSet: 'hitran' })).toBe('hitran')
    expect(setOf({ ...table, strengthSet: 'mies1974', lines: lines(p1) }, { strengthSet: 'hitran' })).toBe('mies1974')
  })

  it('that lacks a line is a problem that names the line and the complete sets', () => {
    expect(problemsOf(fromTable({ ...table, strengthSet: 'hitran', lines: lines(['P1(2)', 'R1(1)']) }))).toEqual([{
      path: 'strengthSet', message: 'The strength set hitran lacks R1(1); complete for these lines: brooke2016, mies1974, theoretical.',
    }])
  })

  it('that the list does not have is a problem that names those it has', () => {
    expect(problemsOf(fromTable({ ...table, strengthSet: 'other', lines: lines(p1) }))[0].message).toBe('The line list oh-meinel has no strength set "other"; it has brooke2016, mies1974, hitran, theoretical.')
  })

  it('is compared with every other complete one, those for comparison only marked', () => {
    const { alternatives } = inputOf(fromTable({ ...table, lines: lines(p1) }))
    expect(alternatives!.map(({ name, comparisonOnly }) => [name, comparisonOnly])).toEqual([['mies1974', undefined], ['hitran', undefined], ['theoretical', true]])
    expect(alternatives!.every(({ einsteinA }) => einsteinA.length === 4 && einsteinA.every(rates => rates!.length === 2))).toBe(true)
    expect(inputOf(fromTable({ ...table, lines: lines(['P1(2)', 'R1(1)']) })).alternatives!.map(({ name }) => name)).toEqual(['mies1974', 'theoretical'])
  })

  it('is named beside the number, with what the band rests on', () => {
    const { cautions } = inputOf(fromTable({ ...table, lines: lines(['P1(2)', 'P1(4)']) }))
    expect(cautions!.join('\n')).toMatch(/v'=3[\s\S]*Brooke et al. 2016[\s\S]*no test of it/)
    expect(inputOf(fromTable({ ...table, lines: lines(p1) })).cautions!.join('\n')).not.toContain('no test of it')
  })
})

describe('noise', () => {
  const bare = (given: (number | null | undefined)[]) => ({ ...table, lines: p1.map((label, i) => ({ label, intensity: 5, ...(given[i] === undefined ? {} : { sigma: given[i] }) })) })

  it('comes from the residuals when no line has a sigma', () => {
    expect(inputOf(fromTable(bare([]))).noise).toBe('from-residuals')
    expect(inputOf(fromTable(bare([null, null, null, null]))).noise).toBe('from-residuals')
  })

  it('is what the settings say when all have one', () => {
    expect(inputOf(fromTable(bare([1, 1, 1, 1]), { noise: 'relative' })).noise).toBe('relative')
    expect(inputOf(fromTable(bare([1, 1, 1, 1]), { noise: 'from-residuals' })).noise).toBe('from-residuals')
  })

  it('is a problem of each line that lacks one while others have it', () => {
    expect(problemsOf(fromTable(bare([1, undefined, 1, null]))).map(({ path }) => path)).toEqual(['lines.1.sigma', 'lines.3.sigma'])
  })
})

describe('the reading', () => {
  it('is the table\'s own, and the settings\' where the table is silent', () => {
    const reading = (more: object, settings = {}) => inputOf(fromTable({ observable: 'brightness-integral', lines: lines(['1-0', '2-1']), ...more }, settings, co)).reading
    expect(reading({})).toEqual({ observable: 'brightness-integral', backgroundTemperature: 2.725 })
    expect(reading({}, { Tbg: 10 })).toEqual({ observable: 'brightness-integral', backgroundTemperature: 10 })
    expect(reading({ Tbg: 0 }, { Tbg: 10 })).toEqual({ observable: 'brightness-integral', backgroundTemperature: 0 })
    expect(reading({ observable: 'level-population', populationPer: 'state' })).toEqual({ observable: 'level-population', populationPer: 'state' })
  })

  it('must say what an equivalent width is measured in, and what a Raman signal counts', () => {
    expect(problemsOf(fromTable({ observable: 'equivalent-width', lines: lines(['1-0', '2-1']) }, {}, co))[0].path).toBe('widthIn')
    expect(inputOf(fromTable({ observable: 'equivalent-width', widthIn: 'velocity', lines: lines(['1-0', '2-1']) }, {}, co)).reading).toEqual({ observable: 'equivalent-width', widthIn: 'velocity' })
    expect(problemsOf(fromTable({ observable: 'raman-scatter', lines: lines(['1-0', '2-1']) }, {}, co))[0].path).toBe('signalIn')
  })
})
