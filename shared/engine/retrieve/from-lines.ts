import { missingReading } from '../line-model/missing-reading'
import { orderedFlags } from '../flags'
import { runToEnd } from '../two-temperatures/run-to-end'
import { twoTemperatures } from '../two-temperatures/two-temperatures'
import type { TwoTemperatureProgress } from '../two-temperatures/two-temperatures'
import type { LineRetrievalInput, RetrievalResult, TemperatureValue, TwoTemperatureResult } from '../types'
import { fitTable } from './fit-table'
import { createLineTable } from './line-table'
import { failedResult } from './failed-result'
import { fitProblem, inputProblem } from './reasons'
import { resultOf } from './result'
import { selectLines } from './select-lines'
import { temperatureValue } from './temperature-value'
import { twoTemperatureCaution } from './two-temperature-words'

/**
 * Rotational temperature from a table of line intensities (estimator 1, the envelope fit, with its diagnostics; estimator 4, two
 * temperatures, beside it when asked for).
 *
 * Lines are thin and share one T; intensities may be negative. Sigmas in the unit of the intensities, energies in cm^-1, T in K.
 * Never throws for data; whatever fails comes back as `temperature: null` with a reason in words. No NaN in the result.
 */
export function retrieveFromLines(input: LineRetrievalInput): RetrievalResult {
  return runToEnd(retrieveFromLinesInSteps(input))
}

/** The same in steps of at most some milliseconds: the caller of `next` may stop between them. One step unless two temperatures are asked for. */
export function* retrieveFromLinesInSteps(input: LineRetrievalInput): Generator<TwoTemperatureProgress, RetrievalResult> {
  const selection = selectLines(input)
  const problem = missingReading(input.reading) ?? inputProblem(input, selection.used.length)
  if (problem !== null) return failedResult(input, selection, problem)
  const fitted = fitTable(createLineTable(input, selection.used))
  if (!fitted) return failedResult(input, selection, 'The covariance of the lines is not positive definite.')
  const reason = fitProblem(fitted)
  if (reason !== undefined) return failedResult(input, selection, reason, fitted)
  const temperature = temperatureValue(fitted)
  if (!temperature || !isFinite(temperature)) return failedResult(input, selection, 'The numbers of the table are too large or too small to be fitted.', fitted)
  const result = resultOf(input, selection, fitted, temperature)
  return input.twoTemperatures ? withTwoTemperatures(result, yield* twoTemperatures(fitted, input.twoTemperatures)) : result
}

function withTwoTemperatures(result: RetrievalResult, found: TwoTemperatureResult): RetrievalResult {
  return {
    ...result,
    twoTemperatures: found,
    flags: orderedFlags([...result.flags, ...(found.preferred ? ['two-temperatures' as const] : [])]),
    cautions: [twoTemperatureCaution(found), ...result.cautions],
  }
}

function isFinite({ value, uNoise, interval68, interval95 }: TemperatureValue): boolean {
  return [value, uNoise, ...interval68, ...interval95].every(number => number === null || Number.isFinite(number))
}
