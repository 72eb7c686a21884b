// Runs the benches one after the other (side by side they would disturb each other) and writes their table.
import { spawnSync } from 'node:child_process'
import { readFileSync, writeFileSync } from 'node:fs'
import { cpus } from 'node:os'
import { here } from './bundle.mjs'
import { runTwin } from './scipy.mjs'

const benches = ['envelope', 'measure', 'pipeline']
const named = process.argv.slice(2)
const unknown = named.filter(name => !benches.includes(name))
if (unknown.length > 0) {
  console.error(`No bench is called ${unknown.join(', ')}. There are: ${benches.join(', ')}.`)
  process.exit(2)
}

function run(name) {
  const { status, stdout } = spawnSync('node', [here(`./${name}-bench.mjs`)], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'inherit'], maxBuffer: 1 << 26 })
  const [record, ...text] = stdout.trim().split('\n').reverse()
  console.log(text.reverse().join('\n'))
  try {
    return { ...JSON.parse(record), passed: status === 0 }
  }
  catch {
    return { name, passed: false }
  }
}

const time = seconds => seconds >= 1 ? `${seconds.toFixed(2)} s` : seconds >= 1e-3 ? `${(seconds * 1e3).toFixed(2)} ms` : `${(seconds * 1e6).toFixed(1)} us`
const row = ({ what, engineSeconds, curveFitSeconds, ratio, target }) =>
  `| ${what} | ${time(engineSeconds)} | ${time(curveFitSeconds)} | ${ratio.toPrecision(3)} | ${target === 1 ? 'above 1' : `at least ${target}`} |`

const results = (named.length > 0 ? named : benches).map(run)
const failed = results.filter(({ passed }) => !passed)
if (failed.length === 0) {
  const table = ['| | Trotline | scipy.optimize.curve_fit | ratio | bar |', '|---|---|---|---|---|', ...results.map(row)].join('\n')
  console.log(`\n${table}`)
  if (named.length === 0) {
    const { version } = JSON.parse(readFileSync(here('../../package.json'), 'utf8'))
    const about = { date: new Date().toISOString().slice(0, 10), version, node: process.version, ...runTwin('versions.py', {}), processor: `${cpus().length} x ${cpus()[0].model.trim()}` }
    writeFileSync(here('../../docs/bench.json'), JSON.stringify({ about, results }, null, 2) + '\n')
    writeFileSync(here('../../docs/BENCH.md'), readFileSync(here('./BENCH.template.md'), 'utf8')
      .replace('{about}', `Trotline ${about.version}, ${about.date}, Node ${about.node}, Python ${about.python}, NumPy ${about.numpy}, SciPy ${about.scipy}, ${about.processor}.`)
      .replace('{table}', table))
  }
}
for (const { name } of failed) console.error(`The bench "${name}" missed its bar or gave another answer.`)
process.exitCode = failed.length === 0 ? 0 : 1
