import { expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { seededNormal, seededRandom } from '../unit/engine/helpers/random'
import { rotorLines, secondRadiation, syntheticInput } from '../unit/engine/helpers/tables'
import { runPython } from './python/run-python'

interface Answer { temperature: number, uncertainty: number, scale: number, uScale: number }

/** 50 invented noisy tables: 4 to 14 lines that reach 1 to 5 kT, signal-to-noise 15 to 200 at the strongest line. */
function noisyTables() {
  const random = seededRandom(20261)
  const normal = seededNormal(77)
  return Array.from({ length: 50 }, () => {
    const count = 4 + Math.floor(random() * 11)
    const B = 1 + 3 * random()
    const lines = rotorLines(count, B)
    const temperature = secondRadiation * B * count * (count + 1) / (1 + 4 * random())
    const exact = syntheticInput({ temperature, lines, scale: 1e6 })
    const strongest = Math.max(...exact.lines.map(line => line.intensity))
    return syntheticInput({ temperature, lines, scale: 1e6, sigma: strongest / (15 + 185 * random()), normal })
  })
}

it('agrees with scipy.optimize.curve_fit in T, scale and their uncertainties to 1e-6 on 50 noisy tables', () => {
  const inputs = noisyTables()
  const results = inputs.map(retrieveFromLines)
  const lowest = (i: number) => Math.min(...inputs[i].lines.map(line => line.components[0].termUpper))
  const answers = runPython<Answer[]>('curve_fit_tables.py', inputs.map((input, i) => ({
    C2: secondRadiation,
    // Energies above the lowest used line, to which the engine's scale refers.
    energy: input.lines.map(line => line.components[0].termUpper - lowest(i)),
    weight: input.lines.map(line => line.components[0].einsteinA * line.components[0].gUpper),
    intensity: input.lines.map(line => line.intensity),
    sigma: input.lines.map(line => line.sigma),
    start: 1.1 / results[i].temperature!.value,
  })))
  expect(answers).toHaveLength(50)
  const apart = (a: number, b: number) => Math.abs(a / b - 1)
  answers.forEach((answer, i) => {
    const { temperature, scales: [scale] } = results[i]
    expect(apart(temperature!.value, answer.temperature), `T of table ${i}`).toBeLessThan(1e-6)
    expect(apart(temperature!.uNoise, answer.uncertainty), `u(T) of table ${i}`).toBeLessThan(1e-6)
    expect(apart(scale.value, answer.scale), `scale of table ${i}`).toBeLessThan(1e-6)
    expect(apart(scale.uNoise!, answer.uScale), `u(scale) of table ${i}`).toBeLessThan(1e-6)
  })
})
