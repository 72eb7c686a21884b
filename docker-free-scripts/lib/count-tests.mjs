// Adds up the reports of all parts; a part without a report, or in which nothing ran, counts as a failure.
import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'

const [folder, ...parts] = process.argv.slice(2)

const counts = (report) => {
  if ('passed' in report) return report
  if ('numTotalTests' in report) {
    // A file that could not be loaded has no tests of its own, yet it failed.
    const unloadable = report.testResults.filter(file => file.status === 'failed' && file.assertionResults.every(test => test.status !== 'failed')).length
    return { passed: report.numPassedTests, failed: report.numFailedTests + unloadable }
  }
  const { expected, unexpected, flaky } = report.stats
  return { passed: expected + flaky, failed: unexpected + report.errors.length }
}

let passed = 0
let failed = 0
for (const part of parts) {
  const path = join(folder, `${part}.json`)
  const count = existsSync(path) ? counts(JSON.parse(readFileSync(path, 'utf8'))) : { passed: 0, failed: 0 }
  if (count.passed + count.failed === 0) {
    console.log(`${part}: no test ran, which counts as a failure`)
    failed += 1
    continue
  }
  console.log(`${part}: ${count.passed} passed, ${count.failed} failed`)
  passed += count.passed
  failed += count.failed
}
console.log(`${passed} passed, ${failed} failed`)
process.exit(failed ? 1 : 0)
