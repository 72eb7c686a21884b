import { describe, expect, it } from 'vitest'
import { decimalsFor, printTemperature } from '../../../shared/engine/format-value'

describe('a printed temperature', () => {
  it('shows the uncertainty with two significant digits and the value to the same place', () => {
    expect(printTemperature({ value: 187.43, uNoise: 1.27 }).text).toBe('187.4 K ± 1.3')
    expect(printTemperature({ value: 9.4104, uNoise: 0.0982 }).text).toBe('9.410 K ± 0.098')
    expect(printTemperature({ value: 184.2, uNoise: 33.9 }).text).toBe('184 K ± 34')
  })

  it('rounds the uncertainty before it counts its digits', () => {
    expect(printTemperature({ value: 11.4432, uNoise: 0.0996 }).text).toBe('11.44 K ± 0.10')
    expect(decimalsFor(9.96)).toBe(0)
  })

  it('gives the systematic part the decimals of the noise', () => {
    expect(printTemperature({ value: 187.43, uNoise: 1.27, uSystematic: 2.1449 })).toMatchObject({ value: '187.4', uncertainty: '1.3', systematic: '2.1' })
  })

  it('prints no uncertainty where none is known', () => {
    expect(printTemperature({ value: 187.43 })).toMatchObject({ text: '187.4 K', uncertainty: null, systematic: null })
    expect(decimalsFor(Infinity)).toBe(1)
    expect(decimalsFor(Number.NaN)).toBe(1)
  })
})
