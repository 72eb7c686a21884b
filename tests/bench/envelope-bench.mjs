// The 14-line table fit (beta, scale, covariance) beside scipy.optimize.curve_fit on the same tables in the same run.
// Last line: JSON with the ratio of the fastest passes. Exit code 1 when the answers differ or the ratio is below the target.
import { performance } from 'node:perf_hooks'
import { normal } from '../../docker-free-scripts/demo/random.mjs'
import { load } from './bundle.mjs'
import { runTwin } from './scipy.mjs'

const target = 60
const repeats = 15
const tableCount = 200
const temperature = 187
const secondRadiation = 1.438776877503933

const { benchLines, prepareFits } = await load('envelope-fits.ts')

const lowest = benchLines[0].components[0].termUpper
const energy = benchLines.map(line => secondRadiation * (line.components[0].termUpper - lowest))
const weight = benchLines.map(line => line.components[0].einsteinA * line.components[0].gUpper)
const exact = energy.map((e, i) => 1000 * weight[i] * Math.exp(-e / temperature))
const noise = Math.max(...exact) / 50
const draw = normal(14)
const tables = Array.from({ length: tableCount }, () => Float64Array.from(exact, value => value + noise * draw()))
const sigma = new Float64Array(exact.length).fill(noise)

const fits = prepareFits(tables, sigma)
for (let i = 0; i < 50; i++) fits()
const seconds = Array.from({ length: repeats }, () => {
  const begin = performance.now()
  fits()
  return (performance.now() - begin) / 1000 / tableCount
})

const job = { energy, weight, sigma: [...sigma], tables: tables.map(table => [...table]), start: [1 / 300, 800], repeats }
const scipy = runTwin('envelope_bench.py', job)

const apart = (a, b) => Math.abs(a / b - 1)
const answers = fits()
const worst = Math.max(...answers.map(([T, u], i) => Math.max(apart(T, scipy.answers[i][0]), apart(u, scipy.answers[i][1]))))
const engine = Math.min(...seconds)
const curveFit = Math.min(...scipy.seconds)
const ratio = curveFit / engine
const passed = ratio >= target && worst < 1e-4
console.log(`14-line table fit: engine ${(engine * 1e6).toFixed(2)} us, curve_fit ${(curveFit * 1e6).toFixed(1)} us, ratio ${ratio.toFixed(1)} (target ${target})`)
console.log(JSON.stringify({ name: 'envelope-14-lines', what: 'table of 14 lines: beta, scale, covariance', engineSeconds: engine, curveFitSeconds: curveFit, ratio, target, worstRelativeDifference: worst, passed }))
process.exitCode = passed ? 0 : 1
