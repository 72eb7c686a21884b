import { missingReading } from '../line-model/missing-reading'
import type { LineRetrievalInput, RetrievalResult, TemperatureValue } from '../types'
import { fitTable } from './fit-table'
import { createLineTable } from './line-table'
import { failedResult } from './failed-result'
import { fitProblem, inputProblem } from './reasons'
import { resultOf } from './result'
import { selectLines } from './select-lines'
import { temperatureValue } from './temperature-value'

/**
 * Rotational temperature from a table of line intensities (estimator 1, the envelope fit, with its diagnostics).
 *
 * Lines are thin and share one T; intensities may be negative. Sigmas in the unit of the intensities, energies in cm^-1, T in K.
 * Never throws for data; whatever fails comes back as `temperature: null` with a reason in words. No NaN in the result.
 */
export function retrieveFromLines(input: LineRetrievalInput): RetrievalResult {
  const selection = selectLines(input)
  const problem = missingReading(input.reading) ?? inputProblem(input, selection.used.length)
  if (problem !== null) return failedResult(input, selection, problem)
  const fitted = fitTable(createLineTable(input, selection.used))
  if (!fitted) return failedResult(input, selection, 'The covariance of the lines is not positive definite.')
  const reason = fitProblem(fitted)
  if (reason !== undefined) return failedResult(input, selection, reason, fitted)
  const temperature = temperatureValue(fitted)
  return temperature && isFinite(temperature)
    ? resultOf(input, selection, fitted, temperature)
    : failedResult(input, selection, 'The numbers of the table are too large or too small to be fitted.', fitted)
}

function isFinite({ value, uNoise, interval68, interval95 }: TemperatureValue): boolean {
  return [value, uNoise, ...interval68, ...interval95].every(number => number === null || Number.isFinite(number))
}
