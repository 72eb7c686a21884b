import { describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import type { LineRetrievalInput, MeasuredLine } from '#shared/engine/types'
import { neighbourCovariance } from '../helpers/problems'
import { seededNormal } from '../helpers/random'
import { readings, rotorLines, secondRadiation, syntheticInput, tableModel } from '../helpers/tables'

const noisy = (seed = 3, count = 8, relative = 0.05) => syntheticInput({ temperature: 60, lines: rotorLines(count, 1.93), relative, normal: seededNormal(seed) })
const without = (input: LineRetrievalInput, i: number) => ({ ...input, lines: input.lines.filter((_, j) => j !== i) })
const otherBand = (lines: MeasuredLine[], factor: number) => lines.map(line => ({ ...line, band: 'hot', intensity: factor * line.intensity, sigma: factor * line.sigma! }))

describe('line by line', () => {
  it('leverages of independent lines add up to the number of parameters', () => {
    const sum = (input: LineRetrievalInput) => retrieveFromLines(input).lines.reduce((total, line) => total + line.leverage!, 0)
    expect(sum(noisy())).toBeCloseTo(2, 10)
    expect(sum({ ...noisy(), covariance: neighbourCovariance(noisy(), 0.3) })).toBeCloseTo(2, 10)
    expect(sum({ ...noisy(), lines: [...noisy().lines, ...otherBand(noisy(4).lines, 0.4)] })).toBeCloseTo(3, 10)
  })

  it('T without a line is the T of the table without it, covariance included', () => {
    const input = noisy()
    const n = input.lines.length
    const covariance = neighbourCovariance(input, 0.3)
    const full = retrieveFromLines(input)
    const correlated = retrieveFromLines({ ...input, covariance })
    for (let i = 0; i < n; i++) {
      expect(full.lines[i].temperatureWithout).toBeCloseTo(retrieveFromLines(without(input, i)).temperature!.value, 8)
      const reduced = covariance.filter((_, at) => at % n !== i && Math.floor(at / n) !== i)
      expect(correlated.lines[i].temperatureWithout).toBeCloseTo(retrieveFromLines({ ...without(input, i), covariance: reduced }).temperature!.value, 8)
    }
  })

  it('the linearised step for large tables stays close to the full refit', () => {
    const input = noisy(2, 70, 0.03)
    const result = retrieveFromLines(input)
    const { value, uNoise } = result.temperature!
    for (const i of [0, 3, 9, 25]) {
      const refit = retrieveFromLines(without(input, i)).temperature!.value
      expect(Math.abs(result.lines[i].temperatureWithout! - refit)).toBeLessThan(0.05 * uNoise)
    }
    expect(result.lines.some(line => Math.abs(line.temperatureWithout! - value) > 0.1 * uNoise)).toBe(true)
  })

  it('standardised residuals have unit variance over many tables', () => {
    const squares = Array.from({ length: 5 }, () => 0)
    const runs = 2000
    for (let seed = 1; seed <= runs; seed++) {
      retrieveFromLines(syntheticInput({ temperature: 40, lines: rotorLines(5, 1.93), relative: 0.02, normal: seededNormal(seed) }))
        .lines.forEach((line, i) => {
          squares[i] += line.residual! ** 2
        })
    }
    // Standard error of a mean square of normal numbers: sqrt(2 / runs) = 0.032.
    for (const square of squares) expect(Math.abs(square / runs - 1)).toBeLessThan(4 * Math.sqrt(2 / runs))
  })

  it('model, ordinate and plot line describe the same fit for every observable', () => {
    for (const reading of readings) {
      const input = syntheticInput({ reading, temperature: 45, lines: rotorLines(6, 1.93), relative: 0.02, normal: seededNormal(6) })
      const result = retrieveFromLines(input)
      const [plot] = result.plotLines
      expect(plot.slope * result.temperature!.value).toBeCloseTo(-secondRadiation, 9)
      const shape = input.lines.map(line => tableModel(reading, line.components[0], result.temperature!.value))
      result.lines.forEach((line, i) => {
        expect(line.model! / result.lines[0].model! / (shape[i] / shape[0])).toBeCloseTo(1, 8)
        const onLine = plot.intercept + plot.slope * line.termEnergy
        expect(line.logRatio! - Math.log(line.intensity / line.model!)).toBeCloseTo(onLine, 7)
        expect(line.sigmaLogRatio).toBeCloseTo(line.sigma! / line.intensity, 12)
      })
    }
  })

  it('a line without logarithm has none, and stays in the fit', () => {
    const input = noisy()
    input.lines[7].intensity = -input.lines[7].sigma!
    const line = retrieveFromLines(input).lines[7]
    expect([line.logRatio, line.sigmaLogRatio]).toEqual([null, null])
    expect(line.used).toBe(true)
    expect(line.residual).toBeLessThan(0)
  })
})

describe('the fit as a whole', () => {
  it('sees curved populations as curvature and poor fit, with the sign of the upward bend', () => {
    const warm = syntheticInput({ temperature: 300, lines: rotorLines(10, 1.93) })
    const mixed = syntheticInput({ temperature: 30, lines: rotorLines(10, 1.93) })
    mixed.lines.forEach((line, i) => {
      const intensity = line.intensity + 0.2 * warm.lines[i].intensity
      Object.assign(line, { intensity, sigma: 0.02 * intensity })
    })
    const result = retrieveFromLines(mixed)
    expect(result.curvatureZ).toBeGreaterThan(3)
    expect(result.flags).toEqual(expect.arrayContaining(['curved', 'poor-fit']))
  })

  it('has a curvature z of unit variance and no bias when there is one temperature', () => {
    let sum = 0
    let square = 0
    const runs = 2000
    for (let seed = 1; seed <= runs; seed++) {
      const z = retrieveFromLines(syntheticInput({ temperature: 40, lines: rotorLines(6, 1.93), relative: 0.02, normal: seededNormal(seed) })).curvatureZ!
      sum += z / runs
      square += z * z / runs
    }
    expect(Math.abs(sum)).toBeLessThan(4 / Math.sqrt(runs))
    expect(Math.abs(square - 1)).toBeLessThan(4 * Math.sqrt(2 / runs))
  })

  it('asks four lines for a curvature', () => {
    expect(retrieveFromLines(noisy(1, 3)).curvatureZ).toBeNull()
    expect(retrieveFromLines(noisy(1, 4)).curvatureZ).not.toBeNull()
  })

  it('has the lever arm C2 (E_max - E_min) / T of one scale, not across bands', () => {
    const input = noisy()
    const shifted = otherBand(noisy(4).lines, 1).map(line => ({ ...line, components: line.components.map(c => ({ ...c, termUpper: c.termUpper + 3000 })) }))
    const result = retrieveFromLines({ ...input, lines: [...input.lines, ...shifted] })
    const energies = input.lines.map(line => line.components[0].termUpper)
    expect(result.leverArm! * result.temperature!.value).toBeCloseTo(secondRadiation * (Math.max(...energies) - Math.min(...energies)), 6)
  })

  it('gives the signal-to-noise of the weakest used line, and the chance of a worse chi2', () => {
    const input = noisy()
    input.lines[5] = { ...input.lines[5], sigma: input.lines[5].intensity / 2.5 }
    const result = retrieveFromLines(input)
    expect(result.weakestSignalToNoise).toBeCloseTo(2.5, 10)
    expect(result.dof).toBe(6)
    expect(result.pValue).toBeGreaterThan(0)
    expect(result.pValue).toBeLessThan(1)
  })
})

describe('bands', () => {
  const input = noisy()
  const second = otherBand(syntheticInput({ temperature: 90, lines: rotorLines(8, 1.93), relative: 0.05, normal: seededNormal(9) }).lines, 0.3)
  const both = { ...input, lines: [...input.lines, ...second] }

  it('have their own temperatures, those of their own tables', () => {
    const result = retrieveFromLines(both)
    expect(result.byBand.map(({ band }) => band)).toEqual(['ground', 'hot'])
    expect(result.byBand[0].temperature).toBeCloseTo(retrieveFromLines(input).temperature!.value, 8)
    expect(result.byBand[1].temperature).toBeCloseTo(retrieveFromLines({ ...input, lines: second }).temperature!.value, 8)
  })

  it('disagree loudly when they are at different temperatures, and not when they are at one', () => {
    expect(retrieveFromLines(both).bandAgreement!.pValue).toBeLessThan(1e-3)
    const agreeing = { ...input, lines: [...input.lines, ...otherBand(noisy(8).lines, 0.3)] }
    expect(retrieveFromLines(agreeing).bandAgreement!.pValue).toBeGreaterThan(1e-3)
    expect(retrieveFromLines(input).bandAgreement).toBeUndefined()
    expect(retrieveFromLines(input).byBand).toEqual([])
  })

  it('share one scale when told so', () => {
    const result = retrieveFromLines({ ...both, bandScales: 'common' })
    expect(result.scales).toHaveLength(1)
    expect(result.dof).toBe(14)
    expect(retrieveFromLines(both).dof).toBe(13)
  })
})

describe('strength sets', () => {
  const input = noisy(3, 6, 0.01)
  const tilted = input.lines.map(line => line.components.map(c => c.einsteinA * Math.exp(0.002 * c.termUpper)))
  const alternatives = [{ name: 'tilted', einsteinA: tilted }, { name: 'partial', einsteinA: tilted.map((rates, i) => i === 2 ? null : rates) }]
  const result = retrieveFromLines({ ...input, strengthSet: 'own', alternatives })

  it('stand side by side, an incomplete one without temperature', () => {
    const swapped = { ...input, lines: input.lines.map((line, i) => ({ ...line, components: line.components.map((c, k) => ({ ...c, einsteinA: tilted[i][k] })) })) }
    expect(result.strengthSets.map(({ name }) => name)).toEqual(['own', 'tilted', 'partial'])
    expect(result.strengthSets[0].temperature).toBe(result.temperature!.value)
    expect(result.strengthSets[1].temperature).toBeCloseTo(retrieveFromLines(swapped).temperature!.value, 9)
    expect(result.strengthSets[2].temperature).toBeNull()
  })

  it('differ by a systematic component common to all, in quadrature with the others', () => {
    const [a, b] = result.strengthSets.map(({ temperature }) => temperature!)
    const component = result.components.find(({ name }) => name === 'strength set')!
    expect(component.commonTo).toBe('all')
    expect(component.kelvin).toBeCloseTo(Math.abs(a - b) / Math.SQRT2, 9)
    expect(result.temperature!.uSystematic).toBeCloseTo(Math.hypot(...result.components.map(({ kelvin }) => kelvin)), 12)
    expect(result.flags).toContain('strength-sets-disagree')
  })

  it('follow the order of the lines given when some are not used', () => {
    const lines = input.lines.map((line, i) => i === 2 ? { ...line, used: false } : line)
    const partial = retrieveFromLines({ ...input, lines, strengthSet: 'own', alternatives })
    expect(partial.strengthSets[2].temperature).toBe(partial.strengthSets[1].temperature)
    expect(partial.strengthSets[2].temperature).not.toBeNull()
  })

  it('are a single one without alternatives, and then no component', () => {
    const alone = retrieveFromLines(input)
    expect(alone.strengthSets).toHaveLength(1)
    expect(alone.components.map(({ name }) => name)).toEqual(['line selection'])
  })
})

describe('line selection', () => {
  const kelvin = (input: LineRetrievalInput) => retrieveFromLines(input).components.find(({ name }) => name === 'line selection')!.kelvin

  it('is small against the noise when the lines share one temperature, large when one line is off', () => {
    const shares = Array.from({ length: 40 }, (_, seed) => kelvin(noisy(seed + 1)) / retrieveFromLines(noisy(seed + 1)).temperature!.uNoise)
    expect(shares.sort((a, b) => a - b)[20]).toBeLessThan(0.5)
    const off = noisy()
    off.lines[6].intensity *= 1.6
    expect(kelvin(off)).toBeGreaterThan(retrieveFromLines(off).temperature!.uNoise)
  })

  it('is common to the line', () => {
    expect(retrieveFromLines(noisy()).components[0].commonTo).toBe('line')
  })
})
