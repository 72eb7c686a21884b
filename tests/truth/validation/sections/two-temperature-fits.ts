import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { seededNormal, seededRandom } from '../../../unit/engine/helpers/random'
import { rotorLines, secondRadiation } from '../../../unit/engine/helpers/tables'
import { twoGases } from '../../../unit/engine/helpers/two-gases'
import { runPython } from '../../python/run-python'
import { relativeError } from '../digits'
import type { Section } from '../report'
import { pythonTable } from './envelope-fits'

interface Answer { temperatures: number[], scales: number[], chi2: number, uncertainties: number[] }

const cases = 200

/** 8 to 20 lines that reach 1.5 to 3 kT of the hot gas, T2 three to six times T1, signal-to-noise 100 to 500 at the strongest line: both gases plainly seen. */
function noisyTables() {
  const random = seededRandom(90125)
  const normal = seededNormal(2112)
  return Array.from({ length: cases }, () => {
    const count = 8 + Math.floor(random() * 13)
    const B = 1 + random()
    const hot = secondRadiation * B * count * (count + 1) / (1.5 + 1.5 * random())
    const cold = hot / (3 + 3 * random())
    return { cold, input: twoGases({ lines: rotorLines(count, B), cold, hot, share: 0.5 + 2 * random(), noise: 1 / (100 + 400 * random()), normal, draws: 1 }) }
  })
}

export const section: Section = {
  order: 31,
  title: 'Two temperatures',
  about: `Estimator 4 on ${cases} invented tables of 8 to 20 noisy lines of two gases, against \`scipy.optimize.least_squares\` (MINPACK,
analytic derivatives, tolerances 1e-15) on the same numbers from the true temperatures. Largest relative difference; required 1e-6.`,
  run: () => {
    const tables = noisyTables()
    const results = tables.map(({ input }) => retrieveFromLines(input).twoTemperatures!)
    const answers = runPython<Answer[]>('two_temperature_fits.py', tables.map(({ cold, input }) => ({ ...pythonTable(input), start: [cold, 4 * cold] })))
    const gas = (i: number, k: number) => results[i].gases![k]
    const worst = (of: (answer: Answer, i: number) => number) => Math.max(...answers.map(of))
    const found: [string, number][] = [0, 1].flatMap((k): [string, number][] => {
      const name = ['cold', 'hot'][k]
      return [
        [`temperature of the ${name} gas`, worst((a, i) => relativeError(gas(i, k).temperature.value, a.temperatures[k]))],
        [`its uncertainty, ${name}`, worst((a, i) => relativeError(gas(i, k).temperature.uNoise!, a.uncertainties[k]))],
        [`scale of the ${name} gas`, worst((a, i) => relativeError(gas(i, k).scales[0].value, a.scales[k]))],
        [`its uncertainty, ${name} `, worst((a, i) => relativeError(gas(i, k).scales[0].uNoise!, a.uncertainties[2 + k]))],
      ]
    })
    found.push(['chi2', worst((a, i) => relativeError(results[i].chi2!, a.chi2))])
    return {
      tables: [{ columns: ['quantity', 'largest relative difference'], rows: found.map(([name, error]) => [name, error.toExponential(1)]) }],
      checks: found.map(([what, error]) => ({ what, found: error, bar: 1e-6, sense: 'most' as const })),
    }
  },
}
