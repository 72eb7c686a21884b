import { airShift } from '../units/air'
import type { FitOutcome } from './fit'
import { solveAt } from './fit'
import type { FitProblem } from './problem'
import { runningSum, scanReach, shiftScore } from './start-shift'
import { widthOfStrongest } from './start-width'

/** chi2 must fall below this part before the medium is called into question. */
const convincing = 0.5

/**
 * A reason in words when the lines fit far better displaced by what air does to a wavelength there: the medium was stated wrongly.
 * Null otherwise, and where that displacement is within the scan anyway. Leaves the fit as it was.
 */
export function airMismatch(problem: FitProblem, outcome: FitOutcome, sign: 1 | -1): string | null {
  const { pixels, system, weighted, window } = problem
  // A width that was fitted where no lines stand says nothing.
  const fwhm = Math.min(Math.exp(outcome.logWidth), widthOfStrongest(pixels, sign))
  const air = airShift((window[0] + window[1]) / 2)
  if (air < scanReach * fwhm) return null
  const running = runningSum(pixels.values, sign)
  const score = (shift: number) => shiftScore(pixels, running, weighted, fwhm, shift)
  const chi2 = system.chi2
  const found = [-air, air].find(shift => score(shift) > score(outcome.shift) && solveAt(system, { shift, logWidth: Math.log(fwhm) }) && system.chi2 < convincing * chi2)
  solveAt(system, outcome)
  if (found === undefined) return null
  const [side, mend] = found < 0 ? ['shorter', 'vacuum but look like air'] : ['longer', 'air but look like vacuum']
  return `All lines stand about ${air.toFixed(3)} nm at ${side} wavelength than they should, which is what air does there: the wavelengths are taken as ${mend}. State the medium anew.`
}
