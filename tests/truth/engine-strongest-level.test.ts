import { expect, it } from 'vitest'
import { strongestLevelInterval, temperatureFromStrongestJ } from '#shared/engine/cross-checks/strongest-level'

/** CO constants in MHz: from memory. */
const B = 57635.968019
const D = 0.18350489
const H = 1.7168e-7
const perCm = 29979.2458
const levels = Array.from({ length: 30 }, (_, J) => {
  const x = J * (J + 1)
  return { energy: (B * x - D * x ** 2 + H * x ** 3) / perCm, degeneracy: 2 * J + 1 }
})
const h = 6.62607015e-34
const k = 1.380649e-23

it('holds J = 1 of CO the fullest level between 5.04 and 21.66 K (truth: exact equality of neighbouring populations)', () => {
  const [low, high] = strongestLevelInterval(levels, 1)
  expect(low!.toFixed(2)).toBe('5.04')
  expect(high!.toFixed(2)).toBe('21.66')
})

it.each([1, 3, 7, 20])('gives levels %i and its neighbours equal populations at the ends of the interval', (J) => {
  const population = (level: number, T: number) => (2 * level + 1) * Math.exp(-h * levels[level].energy * perCm * 1e6 / (k * T))
  const [low, high] = strongestLevelInterval(levels, J)
  expect(population(J, low!) / population(J - 1, low!)).toBeCloseTo(1, 12)
  expect(population(J, high!) / population(J + 1, high!)).toBeCloseTo(1, 12)
  expect(low!).toBeLessThan(high!)
})

it('leaves the side of an end level open', () => {
  expect(strongestLevelInterval(levels, 0)[0]).toBeNull()
  expect(strongestLevelInterval(levels, 29)[1]).toBeNull()
})

it('follows T = (2hcB/k)(J_max + 1/2)^2 (truth: maximum of the continuous envelope of a rigid rotor)', () => {
  const constant = B / perCm
  for (const J of [1, 4, 10]) {
    const T = temperatureFromStrongestJ(constant, J)
    const slope = (j: number) => 2 / (2 * j + 1) - h * B * 1e6 / (k * T) * (2 * j + 1)
    expect(slope(J)).toBeCloseTo(0, 12)
  }
})

it('puts the closed form inside the exact interval', () => {
  for (const J of [1, 2, 5, 12]) {
    const [low, high] = strongestLevelInterval(levels, J)
    const T = temperatureFromStrongestJ(B / perCm, J)
    expect(T).toBeGreaterThan(low!)
    expect(T).toBeLessThan(high!)
  }
})
