import { describe, expect, it } from 'vitest'
import { faddeeva } from '#shared/engine/special/faddeeva'
import { erfc } from '#shared/engine/statistics/erf'
import { seededGenerator } from '#shared/engine/random/seed'

/** 300 places of the upper half plane, from the core to the far wing. */
function places(): [number, number][] {
  const { uniform } = seededGenerator(5)
  return Array.from({ length: 300 }, () => [10 ** (3 * uniform() - 2), 10 ** (6 * uniform() - 5)])
}

describe('the Faddeeva function', () => {
  it('is even in its real and odd in its imaginary part about the line centre', () => {
    for (const [x, y] of places()) {
      const [k, l, kx, ky] = faddeeva(x, y)
      expect([...faddeeva(-x, y)]).toEqual([k, -l, -kx, ky])
    }
  })

  it('is the Gaussian on the real axis and erfcx on the imaginary one', () => {
    for (const x of [0, 0.1, 0.7, 2, 5, 11]) expect(Math.abs(faddeeva(x, 0)[0] / Math.exp(-x * x) - 1)).toBeLessThan(1e-13)
    for (const y of [0, 0.3, 1, 4, 9, 20]) expect(Math.abs(faddeeva(0, y)[0] / (Math.exp(y * y) * erfc(y)) - 1)).toBeLessThan(1e-12)
  })

  it('has the area sqrt(pi) for every damping, as a Voigt profile must', () => {
    for (const y of [0, 0.01, 0.3, 2]) {
      let area = 0
      // x = sinh(t) gathers the wings; the sum of an analytic function over equal steps converges exponentially.
      for (let t = -17.99; t < 18; t += 0.02) area += faddeeva(Math.sinh(t), y)[0] * Math.cosh(t) * 0.02
      const beyond = 2 * y / Math.sqrt(Math.PI) / Math.sinh(18)
      expect(area + beyond).toBeCloseTo(Math.sqrt(Math.PI), 9)
    }
  })

  it('has the derivative that w\' = -2 z w + 2 i / sqrt(pi) gives where that keeps its digits', () => {
    for (const [x, y] of places()) {
      if (x > 5 || y > 5) continue
      const [k, l, re, im] = faddeeva(x, y)
      expect(re).toBeCloseTo(-2 * (x * k - y * l), 12)
      expect(im).toBeCloseTo(2 / Math.sqrt(Math.PI) - 2 * (x * l + y * k), 12)
    }
  })

  it('has the slope that central differences see', () => {
    for (const [x, y] of places()) {
      const d = 1e-4 * Math.max(1, x)
      const slope = (faddeeva(x + d, y)[0] - faddeeva(x - d, y)[0]) / (2 * d)
      expect(Math.abs(slope - faddeeva(x, y)[2])).toBeLessThan(1e-6)
    }
  })

  it('has no step where the rule of nodes changes', () => {
    const h = Math.sqrt(Math.PI / 12)
    for (let n = 0; n < 40; n++) {
      const x = (n / 4 + 0.25) * h
      for (const y of [0, 1e-6, 0.1, 3, Math.PI / h]) {
        const below = faddeeva(x * (1 - 1e-15), y * (1 - 1e-15))
        const above = faddeeva(x * (1 + 1e-15), y * (1 + 1e-15))
        below.forEach((value, i) => expect(Math.abs(value - above[i])).toBeLessThan(2e-13 * Math.max(Math.abs(value), 0.01)))
      }
    }
  })

  it('turns into 2 e^{-z^2} - w(-z) below the real axis and overflows to infinity there, not to a wrong number', () => {
    const [k, l] = faddeeva(0.4, 0.9)
    const e = 2 * Math.exp(0.81 - 0.16)
    const [below, belowIm] = faddeeva(0.4, -0.9)
    expect(below).toBeCloseTo(e * Math.cos(0.72) - k, 13)
    expect(belowIm).toBeCloseTo(e * Math.sin(0.72) + l, 13)
    expect(faddeeva(0, -30)[0]).toBe(Infinity)
  })

  it('writes into the array it is given', () => {
    const out = new Float64Array(4)
    expect(faddeeva(0.5, 0.5, out)).toBe(out)
    expect(out[0]).toBeGreaterThan(0)
  })
})
