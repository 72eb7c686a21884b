import { describe, expect, it } from 'vitest'
import { bitsToFlags, flagsToBits } from '#shared/engine/flags'
import { retrieveFromLines, retrieveFromLinesInSteps } from '#shared/engine/retrieve/from-lines'
import { gasWords } from '#shared/engine/retrieve/two-temperature-words'
import type { LineRetrievalInput, TwoTemperatureGas, TwoTemperatureResult } from '#shared/engine/types'
import { notFinite } from '../helpers/all-numbers'
import { neighbourCovariance } from '../helpers/problems'
import { seededNormal } from '../helpers/random'
import { nameOf, readings, rotorLines, secondRadiation } from '../helpers/tables'
import { twoGases } from '../helpers/two-gases'

const both = (input: LineRetrievalInput) => {
  const result = retrieveFromLines(input)
  return { ...result, two: result.twoTemperatures! }
}
const temperatures = ({ gases }: TwoTemperatureResult) => gases!.map(gas => gas.temperature.value)

describe.each(readings.map(reading => [nameOf(reading), reading] as const))('noise-free lines of two gases, %s', (_, reading) => {
  it('give both temperatures back', () => {
    // Above the background, where there is one: below it a gas absorbs.
    const { two } = both(twoGases({ reading, cold: 30, hot: 200, noise: 1e-4, draws: 1 }))
    const [cold, hot] = temperatures(two)
    expect(Math.abs(cold / 30 - 1)).toBeLessThan(1e-7)
    expect(Math.abs(hot / 200 - 1)).toBeLessThan(1e-7)
    expect(two.gases![0].share + two.gases![1].share).toBeCloseTo(1, 12)
    expect(two.gases![1].share).toBeCloseTo(0.5 / 1.5, 5)
  })
})

describe('with noise', () => {
  const input = twoGases({ normal: seededNormal(3), noise: 0.01, draws: 199 })
  const { two, flags, cautions, temperature, ...result } = both(input)

  it('two gases are told from one, and both fits are shown', () => {
    expect(two.preferred).toBe(true)
    expect(two.probability).toBe(1 / 200)
    expect(two.improvement).toBeCloseTo(result.chi2! - two.chi2!, 9)
    expect(temperature).not.toBeNull()
    expect(flags).toContain('two-temperatures')
    expect(cautions[0]).toMatch(/^Two temperatures, .* K.* and .* K.*, fit the lines better than one beyond what noise explains \(p = 0\.005 from 199 simulated data sets\)/)
    expect(result.method).toBe('two-temperature')
  })

  it('each has an interval that holds the truth at 95 % and its uncertainty inside', () => {
    two.gases!.forEach(({ temperature: { value, uNoise, interval68, interval95 } }, i) => {
      const [low, high] = interval95
      expect(low!).toBeLessThan([30, 200][i])
      expect(high!).toBeGreaterThan([30, 200][i])
      expect(interval68[0]!).toBeGreaterThan(low!)
      expect(interval68[1]!).toBeLessThan(high!)
      expect(value - interval68[0]!).toBeLessThan(3 * uNoise!)
    })
  })

  it('the modelled lines are what two straight lines of the plot add up to', () => {
    expect(two.model).toHaveLength(10)
    result.lines.forEach((line, i) => {
      const parts = two.gases!.map(({ plotLines: [{ intercept, slope }] }) => line.strength * Math.exp(intercept + slope * line.termEnergy))
      expect(parts[0] + parts[1]).toBeCloseTo(two.model![i], 9)
    })
    expect(two.gases![0].plotLines[0].slope).toBeCloseTo(-secondRadiation / two.gases![0].temperature.value, 9)
  })

  it('AICc prefers two gases, and is there from eight lines on', () => {
    expect(two.aicc!.two).toBeLessThan(two.aicc!.one)
    expect(both(twoGases({ lines: rotorLines(7, 1.93), draws: 1 })).two.aicc).toBeNull()
  })

  it('the same seed gives the same p, another seed another one', () => {
    const close = twoGases({ normal: seededNormal(8), noise: 0.08, share: 0.15, draws: 150 })
    const p = (seed: number) => both({ ...close, twoTemperatures: { draws: 150, seed } }).two.probability
    expect(p(7)).toBe(p(7))
    expect(new Set([1, 2, 3, 4].map(p)).size).toBeGreaterThan(1)
  })

  it('order, unit and common factor of the lines do not matter', () => {
    const turned = both({ ...input, lines: [...input.lines].reverse() }).two
    const scaled = both({ ...input, lines: input.lines.map(line => ({ ...line, intensity: 1e-20 * line.intensity, sigma: 1e-20 * line.sigma! })) }).two
    for (const other of [turned, scaled]) {
      temperatures(other).forEach((value, i) => expect(Math.abs(value / temperatures(two)[i] - 1)).toBeLessThan(1e-7))
      expect(other.improvement! / two.improvement!).toBeCloseTo(1, 8)
      other.gases!.forEach((gas, i) => expect(gas.temperature.uNoise! / two.gases![i].temperature.uNoise!).toBeCloseTo(1, 5))
    }
    expect(scaled.probability).toBe(two.probability)
  })

  it('a diagonal covariance says the same as sigmas', () => {
    const other = both({ ...input, covariance: neighbourCovariance(input, 0) }).two
    temperatures(other).forEach((value, i) => expect(value / temperatures(two)[i]).toBeCloseTo(1, 8))
    expect(other.chi2).toBeCloseTo(two.chi2!, 8)
  })
})

describe('noise known up to a factor, or not at all', () => {
  it.each(['relative', 'from-residuals'] as const)('%s: the test is by ratio and does not depend on the factor', (kind) => {
    const input = twoGases({ normal: seededNormal(3), noise: 0.01, draws: 199, kind })
    const doubled = { ...input, lines: input.lines.map(line => ({ ...line, sigma: 2 * line.sigma! })) }
    const [one, other] = [both(input).two, both(doubled).two]
    expect(one.statistic).toBe('ratio')
    expect(one.preferred).toBe(true)
    expect(other.improvement! / one.improvement!).toBeCloseTo(1, 6)
    expect(other.gases![1].temperature.uNoise! / one.gases![1].temperature.uNoise!).toBeCloseTo(1, 6)
    expect(one.pValue).toBeNull()
    expect(one.chi2 === null).toBe(kind === 'from-residuals')
  })
})

describe('one gas is not taken for two:', () => {
  it('noise-free lines show one', () => {
    const { two, flags, cautions } = both(twoGases({ share: 0, draws: 9 }))
    expect(two.gases).toBeNull()
    expect([two.probability, two.preferred, two.improvement]).toEqual([1, false, 0])
    expect(flags).not.toContain('two-temperatures')
    expect(cautions[0]).toBe('Two temperatures were looked for. A second temperature takes nothing from chi2: the lines show one gas.')
  })

  it('p values of 120 noisy tables are below 0.1 in about a tenth of them, and no table is called two gases more often than it should', () => {
    const normal = seededNormal(91)
    const p = Array.from({ length: 120 }, (_, i) => both(twoGases({ share: 0, noise: 0.02, normal, lines: rotorLines(7, 1.93), draws: 39, seed: i })).two.probability!)
    const below = p.filter(value => value <= 0.1).length
    // Binomial(120, 0.1): mean 12, standard deviation 3.3.
    expect(below).toBeGreaterThan(2)
    expect(below).toBeLessThan(23)
    expect(p.every(value => value >= 1 / 40 && value <= 1)).toBe(true)
  })
})

describe('what cannot be done is said:', () => {
  it('five lines are too few, and the fit with one temperature stays', () => {
    const { two, temperature, cautions, flags } = both(twoGases({ lines: rotorLines(5, 1.93) }))
    expect(two.gases).toBeNull()
    expect(two.probability).toBeNull()
    expect(two.reason).toBe('Two temperatures need at least 6 used lines; there are 5.')
    expect(cautions[0]).toBe('Two temperatures were not fitted: Two temperatures need at least 6 used lines; there are 5.')
    expect(temperature).not.toBeNull()
    expect(flags).not.toContain('two-temperatures')
  })

  it('a line that is set aside does not count', () => {
    const input = twoGases({ lines: rotorLines(6, 1.93), draws: 1 })
    expect(both(input).two.gases).not.toBeNull()
    const less = { ...input, lines: input.lines.map((line, i) => ({ ...line, used: i > 0 })) }
    expect(both(less).two.reason).toContain('there are 5')
  })

  it('many bands with scales of their own leave nothing to fit, common scales do', () => {
    const lines = rotorLines(6, 1.93).map((line, i) => ({ ...line, band: `b${i % 3}` }))
    const input = twoGases({ lines, draws: 1 })
    expect(both(input).two.reason).toMatch(/do not determine two temperatures and two scales for each band; use common scales/)
    expect(both({ ...input, bandScales: 'common' }).two.gases).not.toBeNull()
  })

  it('as many unknowns as lines need known noise', () => {
    const lines = rotorLines(6, 1.93).map((line, i) => ({ ...line, band: `b${i % 2}` }))
    const input = twoGases({ lines, draws: 9, normal: seededNormal(2) })
    expect(both(input).two.dof).toBe(0)
    expect(both(input).two.probability).not.toBeNull()
    expect(both({ ...input, noise: 'relative' }).two.reason).toMatch(/do not determine/)
  })

  it('where the fit with one temperature fails there is no second', () => {
    const input = twoGases()
    const failed = retrieveFromLines({ ...input, lines: input.lines.map(line => ({ ...line, intensity: -1 })) })
    expect(failed.temperature).toBeNull()
    expect(failed.method).toBe('two-temperature')
    expect(failed.twoTemperatures).toBeUndefined()
  })

  it('nothing of it appears when it was not asked for', () => {
    const result = retrieveFromLines({ ...twoGases(), twoTemperatures: undefined })
    expect(result.method).toBe('envelope')
    expect('twoTemperatures' in result).toBe(false)
  })
})

describe('in words', () => {
  const gas = (interval95: [number | null, number | null]): TwoTemperatureGas => ({ temperature: { value: 187.43, uNoise: 1.27, interval68: [186, 189], interval95, unit: 'K' }, scales: [], share: 0.5, plotLines: [] })

  it('a temperature that is bounded on one side is told by its bound', () => {
    expect(gasWords(gas([185, 190]))).toBe('187.4 K ± 1.3')
    expect(gasWords(gas([113.4, null]))).toBe('above 113 K')
    expect(gasWords(gas([null, 41.87]))).toBe('below 41.9 K')
    expect(gasWords(gas([null, null]))).toBe('a temperature that is not bounded')
  })

  it('the flag keeps its place behind those that databases hold already', () => {
    expect(flagsToBits(['two-temperatures'])).toBe(1 << 19)
    expect(bitsToFlags(1 << 19 | 1)).toEqual(['few-lines', 'two-temperatures'])
  })
})

describe('steps', () => {
  it('are short, many, and end in the result that one call gives', () => {
    const input = twoGases({ normal: seededNormal(3), draws: 60, lines: rotorLines(20, 1.93) })
    const run = () => {
      const steps = retrieveFromLinesInSteps(input)
      let longest = 0
      let count = 0
      const seen: number[] = []
      for (;;) {
        const begun = performance.now()
        const step = steps.next()
        longest = Math.max(longest, performance.now() - begun)
        count++
        if (step.done) return { longest, count, seen, result: step.value }
        seen.push(step.value.draws)
        expect(step.value.of).toBe(60)
      }
    }
    const runs = [run(), run(), run()]
    // The shortest of three: the machine may be doing something else in one of them.
    expect(Math.min(...runs.map(({ longest }) => longest))).toBeLessThan(100)
    expect(runs[0].count).toBeGreaterThan(120)
    expect(runs[0].seen).toEqual([...runs[0].seen].sort((a, b) => a - b))
    expect(runs[0].seen.at(-1)).toBe(60)
    expect(runs[0].result).toEqual(retrieveFromLines(input))
  })

  it('can be left at any of them', () => {
    const steps = retrieveFromLinesInSteps(twoGases({ draws: 1e6 }))
    for (let i = 0; i < 20; i++) expect(steps.next().done).toBe(false)
    // eslint-disable-next-line @typescript-eslint/no-explicit-any -- nothing is returned by a generator that is left
    expect(steps.return(null as any)).toEqual({ done: true, value: null })
  })

  it('hold no number that is not finite, whatever the data', () => {
    const normal = seededNormal(123)
    for (let draw = 0; draw < 60; draw++) {
      const kind = (['absolute', 'relative', 'from-residuals'] as const)[draw % 3]
      const input = twoGases({ normal, noise: 10 ** (2 * normal() - 2), share: Math.abs(normal()), cold: 5 + 40 * Math.abs(normal()), hot: 60 + 500 * Math.abs(normal()), lines: rotorLines(6 + draw % 9, 1.93).map((line, i) => ({ ...line, band: `b${i % (1 + draw % 2)}` })), kind, draws: 5 })
      expect(notFinite(retrieveFromLines(input))).toEqual([])
    }
  })
})
