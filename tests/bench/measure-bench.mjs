// The measurement of 14 lines in 1024 pixels (areas, shift, width, 3 continuum terms: 19 parameters) beside scipy.optimize.curve_fit
// on the same spectra in the same run. Last line: JSON with the ratio of the fastest passes. Exit code 1 when the answers differ
// or the ratio is below the target.
import { performance } from 'node:perf_hooks'
import { load } from './bundle.mjs'
import { benchSettings, benchSpectrum } from './night.mjs'
import { runTwin } from './scipy.mjs'

const spectrumCount = 20
const passes = 15
const target = 10

const { benchInput, curveFitJob, measureLines } = await load('measure-fits.ts')
const inputs = Array.from({ length: spectrumCount }, (_, i) => benchInput(benchSpectrum(i), benchSettings))
const jobs = inputs.map(curveFitJob)
for (const { x, lines, basis } of jobs) {
  if (x.length !== 1024 || lines !== 14 || basis.length !== 3) throw new Error(`The bench is not what it says: ${x.length} pixels, ${lines} lines, ${basis.length} continuum terms.`)
}

for (let i = 0; i < 5; i++) inputs.forEach(measureLines)
const seconds = Array.from({ length: passes }, () => {
  const begin = performance.now()
  inputs.forEach(measureLines)
  return (performance.now() - begin) / 1000 / spectrumCount
})
const scipy = runTwin('measure_bench.py', { spectra: jobs, passes: 3 })

/** Largest difference of an area, in its standard uncertainties. */
const worst = Math.max(...inputs.map(measureLines).flatMap(({ areas }, s) => areas.map((area, i) => Math.abs(area - scipy.answers[s].areas[i]) / scipy.answers[s].u[i])))
const engine = Math.min(...seconds)
const curveFit = Math.min(...scipy.seconds)
const ratio = curveFit / engine
const passed = ratio >= target && worst < 0.01
console.log(`14-line measurement: engine ${(engine * 1e3).toFixed(3)} ms, curve_fit ${(curveFit * 1e3).toFixed(2)} ms, ratio ${ratio.toFixed(1)} (target ${target})`)
console.log(JSON.stringify({ name: 'measure-14-lines', what: '14 lines in 1024 pixels, 19 parameters, covariance', engineSeconds: engine, curveFitSeconds: curveFit, ratio, target, worstDifferenceInSigma: worst, passed }))
process.exitCode = passed ? 0 : 1
