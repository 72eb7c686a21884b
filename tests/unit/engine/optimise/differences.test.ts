import { describe, expect, it } from 'vitest'
import { differenceJacobian } from '#shared/engine/optimise/differences'
import type { DifferenceRoom } from '#shared/engine/optimise/differences'
import { problemFrom } from '../helpers/least-squares-problems'

const open = (n: number, scale = 0): DifferenceRoom => ({ lower: new Array(n).fill(-Infinity), upper: new Array(n).fill(Infinity), scale: new Array(n).fill(scale) })

/** Jacobian by differences beside the true one. */
function compare(list: (p: Float64Array) => number[], truth: (p: Float64Array) => number[], at: number[], room: DifferenceRoom, points: 2 | 4) {
  const p = Float64Array.from(at)
  const count = list(p).length
  const out = new Float64Array(count * at.length)
  const evaluations = differenceJacobian(problemFrom(count, list), p, room, out, points)
  expect(Array.from(p)).toEqual(at)
  const error = Math.max(...truth(p).map((value, i) => Math.abs(out[i] - value) / Math.max(1, Math.abs(value))))
  return { error, evaluations }
}

const wave = (p: Float64Array) => [Math.sin(p[0]) * p[1], Math.exp(p[0] / 3) + p[1] ** 3]
const waveSlopes = (p: Float64Array) => [Math.cos(p[0]) * p[1], Math.sin(p[0]), Math.exp(p[0] / 3) / 3, 3 * p[1] ** 2]

describe('differences', () => {
  it.each([[2, 2e-10, 4], [4, 1e-11, 8]] as const)('by %i points are right to %f with %i evaluations', (points, bar, count) => {
    const { error, evaluations } = compare(wave, waveSlopes, [0.8, 1.7], open(2), points)
    expect(error).toBeLessThan(bar)
    expect(evaluations).toBe(count)
  })

  it('are exact for polynomials up to the degree of their rule, but for rounding', () => {
    expect(compare(([p]) => [3 * p ** 2 - p], ([p]) => [6 * p - 1], [2], open(1), 2).error).toBeLessThan(1e-10)
    expect(compare(([p]) => [p ** 4], ([p]) => [4 * p ** 3], [2], open(1), 4).error).toBeLessThan(1e-11)
  })

  it.each([1e-12, 1e12])('follow a parameter of size %f', (size) => {
    const { error } = compare(([p]) => [Math.exp(p / size)], ([p]) => [Math.exp(p / size) / size], [size], open(1), 2)
    expect(error / Math.max(1, 1 / size)).toBeLessThan(1e-9)
  })

  it('use the scale at zero, and 1 where there is none', () => {
    expect(compare(([p]) => [Math.sin(p)], () => [1], [0], open(1), 2).error).toBeLessThan(1e-10)
    expect(compare(([p]) => [Math.sin(1e8 * p) / 1e8], () => [1], [0], open(1, 1e-8), 2).error).toBeLessThan(1e-9)
  })

  it('turn to one side at a bound and stay within two of them', () => {
    const atLower = compare(([p]) => [Math.sqrt(p - 1) + p ** 2], ([p]) => [0.5 / Math.sqrt(p - 1) + 2 * p], [1.000001], { lower: [1.000001], upper: [9], scale: [0] }, 2)
    expect(atLower.evaluations).toBe(3)
    const smooth = compare(([p]) => [Math.exp(p)], ([p]) => [Math.exp(p)], [1], { lower: [1], upper: [9], scale: [0] }, 4)
    expect(smooth.error).toBeLessThan(5e-9)
    const between = compare(([p]) => [Math.exp(p)], ([p]) => [Math.exp(p)], [1], { lower: [1 - 1e-9], upper: [1 + 1e-9], scale: [0] }, 2)
    expect(between.error).toBeLessThan(1e-5)
  })

  it('of a parameter that cannot move are zero', () => {
    const out = new Float64Array(1)
    expect(differenceJacobian(problemFrom(1, ([p]) => [p * p]), Float64Array.of(2), { lower: [2], upper: [2], scale: [0] }, out)).toBe(0)
    expect(out[0]).toBe(0)
  })
})
