import { fewLines } from '../thresholds'
import type { FlagName, LineRetrievalInput } from '../types'
import type { LineSelection } from './select-lines'

/** Flags that follow from the input alone. */
export function inputFlags(input: LineRetrievalInput, selection: LineSelection): FlagName[] {
  const flags: FlagName[] = [...input.priorFlags ?? []]
  if (selection.used.length < fewLines) flags.push('few-lines')
  if (input.noise === 'from-residuals') flags.push('sigma-assumed')
  // A line that was only measured carries no reason and is not a rejected one.
  if (selection.reasons.size > 0 || input.lines.some(line => !line.used && line.reason !== undefined)) flags.push('line-rejected')
  return flags
}
