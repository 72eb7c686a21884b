import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { boltzmannConstant, C2, planckConstant, secondRadiationConstant, speedOfLight } from '#shared/engine/constants'

/** Value and unit by quantity; "..." marks digits that were cut. Source: constants/SOURCE.md. */
function readCodata(year: number): Map<string, { digits: string, exponent: number, cut: boolean, uncertainty: string, unit: string }> {
  const text = readFileSync(new URL(`./constants/codata${year}.txt`, import.meta.url), 'utf8')
  return new Map(text.trim().split('\n').map((line) => {
    const value = line.slice(60, 85).trim()
    const [digits, exponent] = value.replace('...', '').replace(/ /g, '').split('e')
    return [line.slice(0, 60).trim(), { digits, exponent: Number(exponent ?? 0), cut: value.includes('...'), uncertainty: line.slice(85, 110).trim(), unit: line.slice(110).trim() }]
  }))
}

describe.each([2018, 2022])('constants against CODATA %i', (year) => {
  const codata = readCodata(year)

  it.each([
    ['Boltzmann constant', boltzmannConstant],
    ['Planck constant', planckConstant],
    ['speed of light in vacuum', speedOfLight],
  ])('%s is the exact value', (name, constant) => {
    const { digits, exponent, uncertainty } = codata.get(name)!
    expect(uncertainty).toBe('(exact)')
    expect(constant.value).toBe(Number(`${digits}e${exponent}`))
  })

  it('keeps every printed digit of the second radiation constant, in cm K', () => {
    const { digits, exponent, cut, unit } = codata.get('second radiation constant')!
    expect(unit).toBe('m K')
    expect(cut).toBe(true)
    const decimals = digits.split('.')[1].length
    expect(Math.floor(C2 / 100 / 10 ** exponent * 10 ** decimals) / 10 ** decimals).toBe(Number(digits))
    expect(secondRadiationConstant.unit).toBe('cm K')
  })

  it('is the inverse of the kelvin-wavenumber relation', () => {
    const { digits, exponent, unit } = codata.get('kelvin-inverse meter relationship')!
    expect(unit).toBe('m^-1')
    expect(100 / C2).toBeCloseTo(Number(`${digits}e${exponent}`), 7)
  })
})

it('states unit and source of every constant', () => {
  for (const constant of [boltzmannConstant, planckConstant, speedOfLight, secondRadiationConstant]) {
    expect(constant.unit).not.toBe('')
    expect(constant.source).toMatch(/CODATA/)
  }
})
