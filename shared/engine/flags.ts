import { flagNames } from './types'
import type { FlagName } from './types'

/** Flags as an integer: bit i stands for flagNames[i]. */
export function flagsToBits(flags: readonly FlagName[]): number {
  return flags.reduce((bits, flag) => bits | (1 << flagNames.indexOf(flag)), 0)
}

/** The flags of an integer, in the order of flagNames; unknown bits are ignored. */
export function bitsToFlags(bits: number): FlagName[] {
  return flagNames.filter((_, i) => (bits >>> i) & 1)
}

/** Flags without repeats, in the order of flagNames. */
export function orderedFlags(flags: Iterable<FlagName>): FlagName[] {
  const set = new Set(flags)
  return flagNames.filter(flag => set.has(flag))
}

/** What a flag says, for pages and mails. */
export const flagWords: Record<FlagName, string> = {
  'few-lines': 'fewer than three lines were used',
  'no-test': 'as many unknowns as lines: the fit cannot be tested',
  'short-lever': 'the line energies span less than kT',
  'weak-line': 'a used line is below signal-to-noise 20: the Boltzmann plot beside the result is biased, the temperature is not',
  'poor-fit': 'the lines do not fit one temperature within their noise',
  'curved': 'the populations are curved: no single temperature describes them',
  'tau-uncorrected': 'lines are optically thick and not corrected',
  'blend': 'another line of the list lies under a used line',
  'saturated': 'a line reaches the end of the detector\'s scale',
  'edge-of-range': 'the temperature lies at an end of the search range',
  'open-interval': 'the noise does not bound the temperature on one side',
  'not-converged': 'the fit did not converge',
  'sigma-assumed': 'no uncertainties were given: the noise is taken from the residuals',
  'line-rejected': 'one or more lines were set aside',
  'q-extrapolated': 'the partition function was extrapolated beyond its table',
  'q-truncated': 'the level list is too short for the partition function',
  'strength-sets-disagree': 'strength sets differ by more than the noise',
  'shift-large': 'the lines stand more than half a width from their list places',
  'response-stale': 'the response curve had expired when the spectrum was taken',
  'two-temperatures': 'two temperatures fit the lines better than one, beyond what noise explains',
}
