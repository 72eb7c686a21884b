import { strengthProblem } from '../line-model/line-strength'
import type { LineRetrievalInput } from '../types'

/** Which lines take part, and why the others do not. */
export interface LineSelection {
  /** Indices into the input's lines. */
  used: number[]
  /** Reason by index, for lines set aside by a rule. */
  reasons: Map<number, string>
}

/** Sets aside lines that no estimator can use; lines that the caller left out stay out. */
export function selectLines(input: LineRetrievalInput): LineSelection {
  const used: number[] = []
  const reasons = new Map<number, string>()
  input.lines.forEach((line, i) => {
    if (!line.used) return
    const reason = dataProblem(input, i) ?? strengthProblem(line, input.reading)
    if (reason === null) used.push(i)
    else reasons.set(i, reason)
  })
  return { used, reasons }
}

function dataProblem(input: LineRetrievalInput, i: number): string | null {
  const { intensity, sigma } = input.lines[i]
  if (!Number.isFinite(intensity)) return 'the intensity is not a number'
  if (input.covariance) {
    const variance = input.covariance[i * input.lines.length + i]
    return variance > 0 && variance < Infinity ? null : 'the variance of the line is not a positive number'
  }
  if (input.noise === 'from-residuals') return null
  if (sigma === null) return 'no uncertainty is given for the line'
  return sigma > 0 && sigma < Infinity ? null : 'the uncertainty of the line is not a positive number'
}
