import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import type { LineRetrievalInput } from '#shared/engine/types'
import { seededNormal, seededRandom } from '../../../unit/engine/helpers/random'
import { rotorLines, secondRadiation, syntheticInput } from '../../../unit/engine/helpers/tables'
import { runPython } from '../../python/run-python'
import { relativeError } from '../digits'
import type { Section } from '../report'

interface Answer { temperature: number, uncertainty: number, scale: number, uScale: number }

const cases = 200

/** Invented noisy tables: 4 to 14 lines that reach 1 to 5 kT, signal-to-noise 15 to 200 at the strongest line. */
function noisyTables(): LineRetrievalInput[] {
  const random = seededRandom(4711)
  const normal = seededNormal(815)
  return Array.from({ length: cases }, () => {
    const count = 4 + Math.floor(random() * 11)
    const B = 1 + 3 * random()
    const lines = rotorLines(count, B)
    const temperature = secondRadiation * B * count * (count + 1) / (1 + 4 * random())
    const exact = syntheticInput({ temperature, lines, scale: 1e6 })
    const strongest = Math.max(...exact.lines.map(line => line.intensity))
    return syntheticInput({ temperature, lines, scale: 1e6, sigma: strongest / (15 + 185 * random()), normal })
  })
}

/** A table as the Python scripts read it, energies above the lowest line. */
export function pythonTable({ lines }: LineRetrievalInput) {
  const lowest = Math.min(...lines.map(line => line.components[0].termUpper))
  return {
    C2: secondRadiation,
    energy: lines.map(line => line.components[0].termUpper - lowest),
    weight: lines.map(line => line.components[0].einsteinA * line.components[0].gUpper),
    intensity: lines.map(line => line.intensity),
    sigma: lines.map(line => line.sigma),
  }
}

export const section: Section = {
  order: 30,
  title: 'Envelope fit',
  about: `Estimator 1 on ${cases} invented tables of 4 to 14 noisy lines, against \`scipy.optimize.curve_fit\` on the same numbers
(tolerances 1e-15, start 10 % away). Largest relative difference; required 1e-6.`,
  run: () => {
    const inputs = noisyTables()
    const results = inputs.map(retrieveFromLines)
    const answers = runPython<Answer[]>('curve_fit_tables.py', inputs.map((input, i) => ({ ...pythonTable(input), start: 1.1 / results[i].temperature!.value })))
    const worst = (of: (answer: Answer, i: number) => number) => Math.max(...answers.map(of))
    const found: [string, number][] = [
      ['temperature', worst((a, i) => relativeError(results[i].temperature!.value, a.temperature))],
      ['uncertainty of the temperature', worst((a, i) => relativeError(results[i].temperature!.uNoise, a.uncertainty))],
      ['scale', worst((a, i) => relativeError(results[i].scales[0].value, a.scale))],
      ['uncertainty of the scale', worst((a, i) => relativeError(results[i].scales[0].uNoise!, a.uScale))],
    ]
    return {
      tables: [{ columns: ['quantity', 'largest relative difference'], rows: found.map(([name, error]) => [name, error.toExponential(1)]) }],
      checks: found.map(([what, error]) => ({ what, found: error, bar: 1e-6, sense: 'most' as const })),
    }
  },
}
