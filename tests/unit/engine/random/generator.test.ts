import { describe, expect, it } from 'vitest'
import { xoshiro128 } from '#shared/engine/random/generator'
import { bootstrapIndices, integerBelow } from '#shared/engine/random/integers'
import { correlatedNormal, normalNumbers } from '#shared/engine/random/normal'
import { poissonCount } from '#shared/engine/random/poisson'
import { largestSeed, seededGenerator, seedState } from '#shared/engine/random/seed'
import { chiSquareTail } from '#shared/engine/statistics/chi-square'
import { normalCdf } from '#shared/engine/statistics/normal'
import { cholesky } from '#shared/engine/linalg/cholesky'
import { poissonTerm } from '#shared/engine/statistics/saddle-point'

const draws = (count: number, draw: () => number) => Array.from({ length: count }, draw)
const mean = (values: number[]) => values.reduce((a, b) => a + b, 0) / values.length
const moment = (values: number[], power: number) => mean(values.map(value => value ** power))
/** p value of observed counts against expected ones. */
const pearson = (observed: number[], expected: number[]) => chiSquareTail(observed.reduce((sum, count, i) => sum + (count - expected[i]) ** 2 / expected[i], 0), observed.length - 1)

/** The recurrence of the paper once more, in BigInt, so that no shift or sign rule of 32-bit integers is shared with the engine. */
function* reference(seed: bigint[]): Generator<number> {
  const mask = 0xFFFFFFFFn
  const rotate = (x: bigint, k: bigint) => ((x << k) | (x >> (32n - k))) & mask
  const s = [...seed]
  for (;;) {
    yield Number(rotate(s[1] * 5n & mask, 7n) * 9n & mask)
    const t = s[1] << 9n & mask
    s[2] ^= s[0]
    s[3] ^= s[1]
    s[1] ^= s[2]
    s[0] ^= s[3]
    s[2] ^= t
    s[3] = rotate(s[3], 11n)
  }
}

describe('xoshiro128**', () => {
  it('begins as published implementations do from state 1, 2, 3, 4 (test vector: from memory)', () => {
    const { bits } = xoshiro128([1, 2, 3, 4])
    expect(draws(6, bits)).toEqual([11520, 0, 5927040, 70819200, 2031721883, 1637235492])
  })

  it.each([[1, 2, 3, 4], [0xFFFFFFFF, 0x80000000, 0x12345678, 0], [0, 0, 0, 1]])('follows the recurrence in unbounded integers from %i, %i, %i, %i', (a, b, c, d) => {
    const { bits } = xoshiro128([a, b, c, d])
    const truth = reference([a, b, c, d].map(BigInt))
    for (let i = 0; i < 5000; i++) expect(bits()).toBe(truth.next().value)
  })

  it('makes uniform numbers of 53 bits from two draws', () => {
    const bits = xoshiro128([9, 8, 7, 6]).bits
    const { uniform } = xoshiro128([9, 8, 7, 6])
    for (let i = 0; i < 100; i++) {
      const exact = (BigInt(bits() >>> 5) << 26n) + BigInt(bits() >>> 6)
      expect(BigInt(uniform() * 2 ** 53)).toBe(exact)
    }
  })

  it('fills a hundred equal cells evenly, also by pairs', () => {
    const { uniform } = seededGenerator(11)
    const cells = new Array<number>(100).fill(0)
    const pairs = new Array<number>(100).fill(0)
    for (let i = 0; i < 200_000; i++) {
      const u = uniform()
      cells[Math.floor(100 * u)]++
      pairs[10 * Math.floor(10 * u) + Math.floor(10 * uniform())]++
    }
    for (const counts of [cells, pairs]) expect(pearson(counts, counts.map(() => 2000))).toBeGreaterThan(1e-4)
  })
})

describe('seeds and streams', () => {
  it('give the same numbers again', () => {
    expect(draws(10, seededGenerator(5, 3).uniform)).toEqual(draws(10, seededGenerator(5, 3).uniform))
  })

  it('give other numbers for every other seed and stream, up to the largest seed', () => {
    const seeds = [0, 1, 2, 2 ** 31, 2 ** 32, 2 ** 32 + 1, 2 ** 40, largestSeed - 1, largestSeed]
    const states = seeds.flatMap(seed => [0, 1, 2, 99, 4294967295].map(stream => seedState(seed, stream).join()))
    expect(new Set(states).size).toBe(states.length)
  })

  it('share nothing between neighbouring streams (correlation of 20,000 pairs below 4 sigma)', () => {
    for (const [a, b] of [[seededGenerator(1, 0), seededGenerator(1, 1)], [seededGenerator(1), seededGenerator(2)], [seededGenerator(7, 12), seededGenerator(8, 12)]]) {
      const sum = mean(draws(20_000, () => (a.uniform() - 0.5) * (b.uniform() - 0.5) * 12))
      expect(Math.abs(sum)).toBeLessThan(4 / Math.sqrt(20_000))
    }
  })

  it('have first numbers that are uniform over streams', () => {
    const cells = new Array<number>(20).fill(0)
    for (let stream = 0; stream < 20_000; stream++) cells[Math.floor(20 * seededGenerator(42, stream).uniform())]++
    expect(pearson(cells, cells.map(() => 1000))).toBeGreaterThan(1e-4)
  })
})

describe('normal numbers', () => {
  it('have the moments of the standard normal distribution', () => {
    const values = draws(200_000, normalNumbers(seededGenerator(3)))
    // Standard errors: 1, sqrt 2, sqrt 15, sqrt 96 over sqrt n.
    const n = Math.sqrt(values.length)
    expect(Math.abs(moment(values, 1))).toBeLessThan(4 / n)
    expect(Math.abs(moment(values, 2) - 1)).toBeLessThan(4 * Math.SQRT2 / n)
    expect(Math.abs(moment(values, 3))).toBeLessThan(4 * Math.sqrt(15) / n)
    expect(Math.abs(moment(values, 4) - 3)).toBeLessThan(4 * Math.sqrt(96) / n)
  })

  it('fall evenly into fifty cells of equal probability', () => {
    const draw = normalNumbers(seededGenerator(8))
    const cells = new Array<number>(50).fill(0)
    for (let i = 0; i < 100_000; i++) cells[Math.min(49, Math.floor(50 * normalCdf(draw())))]++
    expect(pearson(cells, cells.map(() => 2000))).toBeGreaterThan(1e-4)
  })

  it('take on a covariance', () => {
    const covariance = [4, 1.2, -0.6, 1.2, 1, 0.3, -0.6, 0.3, 2]
    const factor = cholesky(covariance, 3)!
    const draw = normalNumbers(seededGenerator(21))
    const samples = Array.from({ length: 100_000 }, () => correlatedNormal(factor, 3, draw))
    for (let i = 0; i < 3; i++) {
      for (let j = 0; j <= i; j++) {
        const found = mean(samples.map(x => x[i] * x[j]))
        const error = Math.sqrt((covariance[3 * i + i] * covariance[3 * j + j] + covariance[3 * i + j] ** 2) / samples.length)
        expect(Math.abs(found - covariance[3 * i + j]), `${i} ${j}`).toBeLessThan(4.5 * error)
      }
    }
  })
})

describe('whole numbers', () => {
  it('are equally likely also below a number that does not divide 2^32', () => {
    const generator = seededGenerator(17)
    const counts = new Array<number>(7).fill(0)
    for (let i = 0; i < 70_000; i++) counts[integerBelow(generator, 7)]++
    expect(pearson(counts, counts.map(() => 10_000))).toBeGreaterThan(1e-4)
  })

  it('draw again where a remainder would favour small numbers', () => {
    // 2^32 - 2^32 mod 3 = 4294967295: the largest draw is refused.
    const bits = [4294967295, 4294967294]
    expect(integerBelow({ bits: () => bits.shift()!, uniform: () => 0 }, 3)).toBe(4294967294 % 3)
    expect(bits).toEqual([])
  })

  it('make bootstrap samples that miss each place with probability (1 - 1/n)^n', () => {
    const generator = seededGenerator(4)
    let missed = 0
    for (let i = 0; i < 20_000; i++) if (!bootstrapIndices(generator, 8).includes(5)) missed++
    const p = (7 / 8) ** 8
    expect(Math.abs(missed / 20_000 - p)).toBeLessThan(4 * Math.sqrt(p * (1 - p) / 20_000))
  })
})

describe('Poisson counts', () => {
  it.each([0.3, 2.5, 9.9, 10, 14, 77.7, 1200])('of mean %f are distributed as the formula says', (m) => {
    const generator = seededGenerator(99)
    const low = Math.max(0, Math.floor(m - 3 * Math.sqrt(m)))
    const high = Math.ceil(m + 3 * Math.sqrt(m))
    const total = 50_000
    const observed = new Array<number>(high - low + 2).fill(0)
    for (let i = 0; i < total; i++) observed[Math.min(Math.max(poissonCount(generator, m) - low, 0), high - low + 1)]++
    const probability = (k: number) => k === 0 ? Math.exp(-m) : poissonTerm(k, m)
    const expected = observed.map((_, i) => total * probability(low + i))
    // The end cells hold everything beyond them.
    for (let k = 0; k < low; k++) expected[0] += total * probability(k)
    expected[expected.length - 1] = total - expected.slice(0, -1).reduce((a, b) => a + b, 0)
    const keep = expected.flatMap((e, i) => e > 5 ? i : [])
    expect(pearson(keep.map(i => observed[i]), keep.map(i => expected[i]))).toBeGreaterThan(1e-4)
  })

  it('are zero for a mean that is zero, negative or not a number', () => {
    for (const m of [0, -3, Number.NaN]) expect(poissonCount(seededGenerator(1), m)).toBe(0)
  })
})
