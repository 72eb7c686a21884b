// 200 spectra of 1024 pixels through the whole service with one worker, from the POST of the batch to its last stored result, beside
// scipy.optimize.curve_fit that measures the same lines of the same spectra in one process.
// Last line: JSON. Exit code 1 when the pipeline is the slower one or a temperature is not the engine's own.
import { load } from './bundle.mjs'
import { benchSettings, benchSpectrum } from './night.mjs'
import { runTwin } from './scipy.mjs'

const spectrumCount = 200

const { benchInput, curveFitJob, retrieveFromSpectrum } = await load('measure-fits.ts')
const { runPipeline } = await load('pipeline-bench.ts')
const inputs = Array.from({ length: spectrumCount }, (_, i) => benchInput(benchSpectrum(i), benchSettings))
const spectra = inputs.map(curveFitJob)

const { seconds: pipeline, stored } = await runPipeline(spectrumCount, benchSpectrum, benchSettings)
const curveFit = runTwin('measure_bench.py', { spectra, passes: 1 }).seconds[0] * spectrumCount

const lines = Math.min(...stored.map(({ labels }) => labels.length))
const pixels = Math.min(...stored.map(each => each.pixels))
const worst = Math.max(...stored.map(({ temperature }, i) => Math.abs(temperature / retrieveFromSpectrum(inputs[i]).temperature.value - 1)))
const ratio = curveFit / pipeline
const passed = ratio > 1 && worst < 1e-9
const each = (1000 * pipeline / spectrumCount).toFixed(1)
console.log(`pipeline, ${stored.length} spectra of ${pixels} pixels, ${lines} lines fitted in each: ${pipeline.toFixed(2)} s (${each} ms a retrieval), curve_fit ${curveFit.toFixed(2)} s, ratio ${ratio.toFixed(2)} (must be above 1)`)
console.log(JSON.stringify({ name: 'pipeline-200-spectra', what: '200 spectra of 1024 pixels and 14 lines through the service, one worker', engineSeconds: pipeline, curveFitSeconds: curveFit, ratio, target: 1, lines, pixels, worstRelativeDifference: worst, passed }))
process.exitCode = passed ? 0 : 1
