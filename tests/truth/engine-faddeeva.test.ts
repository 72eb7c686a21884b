import { describe, expect, it } from 'vitest'
import { faddeeva } from '#shared/engine/special/faddeeva'
import { runPython } from './python/run-python'

type Point = [x: number, y: number]
type Value = [re: number, im: number, slopeRe: number, slopeIm: number]

const truth = (how: 'scipy' | 'exact', points: Point[]) => runPython<Value[]>('faddeeva.py', { how, points })
const parts = ['Re w', 'Im w', "Re w'", "Im w'"]

const steps = (from: number, to: number, count: number) => Array.from({ length: count }, (_, i) => from + (to - from) * i / (count - 1))
const powers = (from: number, to: number, count: number) => steps(from, to, count).map(p => 10 ** p)
const grid = (xs: number[], ys: number[]) => xs.flatMap(x => ys.map((y): Point => [x, y]))

const apart = (a: number, b: number) => a === b ? 0 : Math.abs(a / b - 1)
const worst = (points: Point[], values: Value[], part: number) => points.reduce((most, [x, y], i) => {
  const error = apart(faddeeva(x, y)[part], values[i][part])
  return error > most.error ? { error, x, y, truth: values[i][part] } : most
}, { error: 0, x: 0, y: 0, truth: 0 })

/** Every place of a Voigt profile from the core to the far wing, from a pure Gaussian to a pure Lorentzian. */
const everywhere = grid([0, ...powers(-12, 7, 58), ...steps(0.01, 12, 97)], [0, ...powers(-20, 7, 55), ...steps(0.05, 9, 37)])
const near = grid([0, ...powers(-9, 0, 10), ...steps(0.013, 9.1, 57)], [0, ...powers(-18, 0, 10), ...steps(0.07, 7.3, 21)])

describe('w(z) in the upper half plane', () => {
  const values = truth('scipy', everywhere)

  it.each([0, 1])('agrees with scipy in part %i to 1e-12, relative', (part) => {
    const used = everywhere.map((_, i) => i).filter(i => Math.abs(values[i][part]) > 1e-300)
    expect(used.length).toBeGreaterThan(13_000)
    const found = worst(used.map(i => everywhere[i]), used.map(i => values[i]), part)
    expect(found.error, `${parts[part]} ${JSON.stringify(found)}`).toBeLessThan(1e-12)
  })
})

describe('w(z) and its derivative against 140-digit series, |z| < 12', () => {
  const values = truth('exact', near)

  it.each([0, 1])('agrees in part %i to 1e-13, relative', (part) => {
    const found = worst(near, values, part)
    expect(found.error, `${parts[part]} ${JSON.stringify(found)}`).toBeLessThan(1e-13)
  })

  it('has a derivative that is off by less than 1e-13 of its modulus', () => {
    const found = near.reduce((most, [x, y], i) => {
      const [, , re, im] = faddeeva(x, y)
      const error = Math.hypot(re - values[i][2], im - values[i][3]) / Math.hypot(values[i][2], values[i][3])
      return error > most.error ? { error, x, y } : most
    }, { error: 0, x: 0, y: 0 })
    expect(found.error, JSON.stringify(found)).toBeLessThan(1e-13)
  })

  it('has a real derivative, the slope of the profile, to 1e-11 where it is not at a turning point', () => {
    const found = worst(near.filter(([x]) => x > 0), values.filter((_, i) => near[i][0] > 0), 2)
    expect(found.error, JSON.stringify(found)).toBeLessThan(1e-11)
  })
})

describe('elsewhere', () => {
  it('agrees with scipy in the lower half plane to 1e-12 of its modulus', () => {
    const points = grid(steps(-9, 9, 31), steps(-6, -0.01, 17))
    const values = truth('scipy', points)
    points.forEach(([x, y], i) => {
      const [re, im] = faddeeva(x, y)
      expect(Math.hypot(re - values[i][0], im - values[i][1]) / Math.hypot(values[i][0], values[i][1]), `${x} ${y}`).toBeLessThan(1e-12)
    })
  })

  it('keeps the derivative where -2 z w + 2 i / sqrt(pi) loses it (truth: w = i / (sqrt(pi) z) (1 + 1 / (2 z^2) + 3 / (4 z^4) + 15 / (8 z^6) ...), DLMF 7.12.1)', () => {
    for (const r of [1e3, 1e5, 1e7]) {
      // On the imaginary axis w' is purely imaginary: i / sqrt(pi) (1 / y^2 - 3 / (2 y^4) + 15 / (4 y^6)).
      const [, , re, im] = faddeeva(0, r)
      expect(Math.abs(re)).toBe(0)
      expect(apart(im, (1 / r ** 2 - 1.5 / r ** 4 + 3.75 / r ** 6) / Math.sqrt(Math.PI))).toBeLessThan(1e-14)
    }
  })

  it('is finite up to the largest numbers', () => {
    for (const [x, y] of [[1e100, 0], [0, 1e100], [1e300, 1e300], [-1e200, 1], [1.7e308, 1e-300]] as Point[]) {
      expect([...faddeeva(x, y)].every(Number.isFinite), `${x} ${y}`).toBe(true)
    }
    expect(apart(faddeeva(0, 1e100)[0], 1e-100 / Math.sqrt(Math.PI))).toBeLessThan(1e-15)
  })
})
