import { describe, expect, it } from 'vitest'
import { compileModel } from '#shared/engine/line-model/compiled-model'
import { lineStrength, strengthProblem } from '#shared/engine/line-model/line-strength'
import { lineValue } from '#shared/engine/line-model/line-value'
import { missingReading } from '#shared/engine/line-model/missing-reading'
import { createShapes, evaluateShapes, shapeExponent } from '#shared/engine/line-model/shapes'
import type { CompiledModel } from '#shared/engine/line-model/compiled-model'
import type { Observable } from '#shared/engine/types'
import { nameOf, readings, rotorLines, secondRadiation, tableModel } from '../helpers/tables'

const lines = rotorLines(5, 1.93)
const allReadings = [...readings, { observable: 'brightness-integral', backgroundTemperature: 40 } as const]

/** w phi with energies above the reference, undoing the guard. */
function valuesAt(model: CompiledModel, beta: number): number[] {
  const shapes = createShapes(model.lineCount)
  evaluateShapes(model, beta, shapes)
  return [...shapes.value].map(value => value * model.strengthUnit * Math.exp(-shapeExponent(model, beta)))
}

describe.each(allReadings.map(reading => [nameOf(reading), reading] as const))('line model of %s', (_, reading) => {
  const model = compileModel(lines, reading)

  it.each([4, 25, 187.4, 3000])('follows its formula at %d K', (T) => {
    valuesAt(model, 1 / T).forEach((value, i) => {
      const truth = tableModel(reading, lines[i].components[0], T) * Math.exp(secondRadiation * model.referenceEnergy / T)
      expect(value / truth).toBeCloseTo(1, 10)
    })
  })

  it.each([4, 25, 187.4, 3000])('has the derivatives of its values at %d K', (T) => {
    const beta = 1 / T
    const step = 1e-4 * beta
    const [below, at, above] = [beta - step, beta, beta + step].map((b) => {
      const shapes = createShapes(model.lineCount)
      evaluateShapes(model, b, shapes)
      return shapes
    })
    for (let i = 0; i < model.lineCount; i++) {
      const size = Math.abs(at.first[i]) + Math.abs(at.value[i]) / beta
      expect(Math.abs((above.value[i] - below.value[i]) / (2 * step) - at.first[i]) / size).toBeLessThan(1e-6)
      const bend = Math.abs(at.second[i]) + Math.abs(at.value[i]) / beta ** 2
      expect(Math.abs((above.first[i] - below.first[i]) / (2 * step) - at.second[i]) / bend).toBeLessThan(1e-6)
    }
  })

  it('gives a line the sum of its components', () => {
    const pair = [{ ...lines[1], components: [lines[1].components[0], lines[2].components[0]] }]
    const single = compileModel([lines[1], lines[2]], reading)
    const [a, b] = valuesAt(single, 1 / 90)
    expect(valuesAt(compileModel(pair, reading), 1 / 90)[0] / (a + b)).toBeCloseTo(1, 12)
  })

  it('evaluates one line alone like among others', () => {
    const beta = 1 / 77
    const value = lineValue(lines[3], reading, beta, model.referenceEnergy)
    expect(value.value / valuesAt(model, beta)[3]).toBeCloseTo(1, 12)
    const step = 1e-6 * beta
    const ahead = lineValue(lines[3], reading, beta + step, model.referenceEnergy).value
    const behind = lineValue(lines[3], reading, beta - step, model.referenceEnergy).value
    expect(Math.log(ahead / behind) / (2 * step)).toBeCloseTo(value.logSlope, 2)
  })

  it('does not overflow at 2 K with energies of 20000 cm^-1', () => {
    const high = rotorLines(5, 20).map(line => ({ ...line, components: line.components.map(c => ({ ...c, termUpper: c.termUpper + 2e4, termLower: c.termLower + 2e4 })) }))
    const shapes = createShapes(5)
    evaluateShapes(compileModel(high, reading), 0.5, shapes)
    for (const value of [...shapes.value, ...shapes.first, ...shapes.second]) expect(Number.isFinite(value)).toBe(true)
  })
})

it('makes no line at the background temperature itself', () => {
  const model = compileModel(lines, { observable: 'brightness-integral', backgroundTemperature: 40 })
  for (const value of valuesAt(model, 1 / 40)) expect(value === 0).toBe(true)
})

it('weights the plot energy by strength', () => {
  const [a, b] = [lines[0].components[0], lines[1].components[0]]
  const { strength, termEnergy, wavenumber } = lineStrength({ label: 'x', band: 'b', components: [a, b] }, { observable: 'photon-emission' })
  const [wa, wb] = [a, b].map(c => c.einsteinA * c.gUpper)
  expect(strength).toBeCloseTo(wa + wb, 20)
  expect(termEnergy).toBeCloseTo((wa * a.termUpper + wb * b.termUpper) / (wa + wb), 10)
  expect(wavenumber).toBeCloseTo((a.wavenumber + b.wavenumber) / 2, 12)
})

it('asks for what an observable needs and assumes nothing', () => {
  const asked: [Observable, RegExp][] = [
    ['brightness-integral', /background/], ['equivalent-width', /wavelength/], ['level-population', /level/], ['raman-scatter', /photons/],
  ]
  for (const [observable, words] of asked) expect(missingReading({ observable })).toMatch(words)
  for (const reading of readings) expect(missingReading(reading)).toBeNull()
  expect(missingReading({ observable: 'colour' as Observable })).toMatch(/known/)
})

it.each([
  ['no component', [], /component/],
  ['an infinite energy', [{ ...lines[0].components[0], termUpper: Infinity }], /energy/],
  ['a negative strength', [{ ...lines[0].components[0], einsteinA: -1 }], /strength/],
  ['no strength', [{ ...lines[0].components[0], einsteinA: 0 }], /strength/],
])('names what is wrong with a line of %s', (_, components, words) => {
  expect(strengthProblem({ label: 'x', band: 'b', components }, { observable: 'photon-emission' })).toMatch(words)
})

it('needs a wavenumber where stimulated emission enters, and Raman data where Raman lines are read', () => {
  const line = { label: 'x', band: 'b', components: [{ ...lines[0].components[0], wavenumber: 0, raman: undefined }] }
  expect(strengthProblem(line, { observable: 'absorption-area' })).not.toBeNull()
  expect(strengthProblem(line, { observable: 'raman-scatter', signalIn: 'photons' })).toMatch(/Raman/)
  expect(strengthProblem(line, { observable: 'photon-emission' })).toBeNull()
})

it('gives anti-Stokes lines their own initial level and no strength below J = 2', () => {
  const raman = { scatteredWavenumber: 19000, spinWeight: 1, J: 3, branch: 'anti-stokes' } as const
  const component = { ...lines[2].components[0], raman }
  const reading = { observable: 'raman-scatter', signalIn: 'photons' } as const
  const { strength, termEnergy } = lineStrength({ label: 'O', band: 'b', components: [component] }, reading)
  expect(strength / (3 * 2 / 5 * 19000 ** 3)).toBeCloseTo(1, 14)
  expect(termEnergy).toBe(component.termUpper)
  expect(strengthProblem({ label: 'O', band: 'b', components: [{ ...component, raman: { ...raman, J: 1 } }] }, reading)).toMatch(/no strength/)
})
