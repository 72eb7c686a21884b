// The 14-line table fit (beta, scale, covariance) beside scipy.optimize.curve_fit on the same tables in the same run.
// Last line: JSON with the ratio of the fastest passes. Exit code 1 when the answers differ or the ratio is below the target.
import { execFileSync } from 'node:child_process'
import { rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { performance } from 'node:perf_hooks'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build } from 'esbuild'

const target = 60
const repeats = 15
const tableCount = 200
const temperature = 187
const secondRadiation = 1.438776877503933

const here = path => fileURLToPath(new URL(path, import.meta.url))
const bundle = join(tmpdir(), `envelope-fits-${process.pid}.mjs`)
await build({ entryPoints: [here('./envelope-fits.ts')], bundle: true, platform: 'node', format: 'esm', outfile: bundle, logLevel: 'error' })
const { benchLines, prepareFits } = await import(pathToFileURL(bundle).href)
rmSync(bundle)

/** Seeded standard normal numbers: mulberry32 and Box-Muller. */
function seededNormal(seed) {
  let state = seed
  const random = () => {
    state = (state + 0x6D2B79F5) >>> 0
    let t = Math.imul(state ^ (state >>> 15), state | 1)
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61)
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
  return () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random())
}

const lowest = benchLines[0].components[0].termUpper
const energy = benchLines.map(line => secondRadiation * (line.components[0].termUpper - lowest))
const weight = benchLines.map(line => line.components[0].einsteinA * line.components[0].gUpper)
const exact = energy.map((e, i) => 1000 * weight[i] * Math.exp(-e / temperature))
const noise = Math.max(...exact) / 50
const normal = seededNormal(14)
const tables = Array.from({ length: tableCount }, () => Float64Array.from(exact, value => value + noise * normal()))
const sigma = new Float64Array(exact.length).fill(noise)

const fits = prepareFits(tables, sigma)
for (let i = 0; i < 50; i++) fits()
const seconds = Array.from({ length: repeats }, () => {
  const begin = performance.now()
  fits()
  return (performance.now() - begin) / 1000 / tableCount
})

const job = { energy, weight, sigma: [...sigma], tables: tables.map(table => [...table]), start: [1 / 300, 800], repeats }
const scipy = JSON.parse(execFileSync('/usr/bin/python3', [here('./envelope_bench.py')], { input: JSON.stringify(job), encoding: 'utf8', maxBuffer: 1 << 26 }))

const apart = (a, b) => Math.abs(a / b - 1)
const answers = fits()
const worst = Math.max(...answers.map(([T, u], i) => Math.max(apart(T, scipy.answers[i][0]), apart(u, scipy.answers[i][1]))))
const engine = Math.min(...seconds)
const curveFit = Math.min(...scipy.seconds)
const ratio = curveFit / engine
console.log(`14-line table fit: engine ${(engine * 1e6).toFixed(2)} us, curve_fit ${(curveFit * 1e6).toFixed(1)} us, ratio ${ratio.toFixed(1)} (target ${target})`)
console.log(JSON.stringify({ name: 'envelope-14-lines', engineSeconds: engine, curveFitSeconds: curveFit, ratio, target, worstRelativeDifference: worst, passed: ratio >= target && worst < 1e-4 }))
process.exitCode = ratio >= target && worst < 1e-4 ? 0 : 1
