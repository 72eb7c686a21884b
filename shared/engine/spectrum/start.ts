import type { Point } from './fit'
import { solveAt } from './fit'
import type { Free } from './nonlinear'
import type { FitProblem } from './problem'
import { shiftCandidates } from './start-shift'

const widthFactors = [0.5, 0.7, 1.4, 2]

function best(problem: FitProblem, points: Point[]): Point {
  let winner = points[0]
  let least = Infinity
  for (const point of points) {
    if (solveAt(problem.system, point) && problem.system.chi2 < least) {
      least = problem.system.chi2
      winner = point
    }
  }
  return winner
}

/** Where the fit starts: the best of a few shifts, then (when the width was only guessed) of a few widths. */
export function startPoint(problem: FitProblem, fwhm: number, free: Free, widthGuessed: boolean, sign: 1 | -1): Point {
  const logWidth = Math.log(fwhm)
  const shifts = free.shift ? shiftCandidates(problem.pixels, problem.weighted, fwhm, sign) : [0]
  const place = best(problem, shifts.map(shift => ({ shift, logWidth })))
  if (!free.width || !widthGuessed) return place
  return best(problem, [place, ...widthFactors.map(factor => ({ shift: place.shift, logWidth: logWidth + Math.log(factor) }))])
}
