import type { LinearSystem } from './linear-system'
import type { Free } from './nonlinear'
import { invertFree, ShiftAndWidth } from './nonlinear'

export interface Point { shift: number, logWidth: number }

export interface FitLimits {
  /** Largest |shift|, nm. */
  shift: number
  /** Range of the FWHM, nm. */
  width: [number, number]
}

export interface FitOutcome extends Point {
  converged: boolean
  iterations: number
  reason: string
  /** Inverse of the projected matrix of (shift, ln width): [shift shift, shift width, width width]; zero where fixed. */
  inverse: [number, number, number]
  nonlinear: ShiftAndWidth | null
}

const maxIterations = 60
/** Converged: the next step would move the shift by less than this part of the FWHM and the width by less than this part of itself. */
const stepTolerance = 1e-8
/** A change of chi2 below this part of it is rounding. */
const rounding = 1e-13
const largestDamping = 1e10

/** Evaluates the columns at a point and solves for areas and continuum there. */
export function solveAt(system: LinearSystem, { shift, logWidth }: Point): boolean {
  system.columns.fill(shift, Math.exp(logWidth))
  return system.solve()
}

function dampedStep(nonlinear: ShiftAndWidth, free: Free, damping: number): Point | null {
  const { schur, gradient } = nonlinear
  const inverse = invertFree([schur[0] * (1 + damping), schur[1], schur[2], schur[3] * (1 + damping)], free)
  if (!inverse) return null
  return { shift: inverse[0] * gradient[0] + inverse[1] * gradient[1], logWidth: inverse[1] * gradient[0] + inverse[2] * gradient[1] }
}

const clamp = (x: number, low: number, high: number) => Math.min(high, Math.max(low, x))

function moved(from: Point, step: Point, limits: FitLimits): Point {
  const fwhm = Math.exp(from.logWidth)
  return {
    shift: clamp(from.shift + clamp(step.shift, -fwhm, fwhm), -limits.shift, limits.shift),
    logWidth: clamp(from.logWidth + clamp(step.logWidth, -0.7, 0.7), Math.log(limits.width[0]), Math.log(limits.width[1])),
  }
}

const isSmall = (step: Point, fwhm: number) => Math.abs(step.shift) < stepTolerance * fwhm && Math.abs(step.logWidth) < stepTolerance

function atLimit({ shift, logWidth }: Point, free: Free, limits: FitLimits): string | null {
  if (free.shift && Math.abs(shift) >= limits.shift) return 'The shift ran to the end of its range: the lines do not stand where the list says.'
  const fwhm = Math.exp(logWidth)
  const [low, high] = limits.width
  if (free.width && (fwhm <= low * (1 + 1e-9) || fwhm >= high * (1 - 1e-9))) return 'The width ran to the end of its range.'
  return null
}

/**
 * Levenberg-Marquardt on shift and ln width, areas and continuum being solved exactly at every point.
 * A step is taken only when chi2 does not grow; a worse one is undone and damped ten times more.
 * Ends when the next step is negligible (stepTolerance), when no step lowers chi2 beyond rounding, or after 60 steps.
 */
export function fitShiftAndWidth(system: LinearSystem, start: Point, free: Free, limits: FitLimits): FitOutcome {
  const end = (point: Point, converged: boolean, iterations: number, reason: string, nonlinear: ShiftAndWidth | null): FitOutcome => {
    const inverse = nonlinear && invertFree(nonlinear.schur, free)
    return { ...point, converged, iterations, reason, nonlinear, inverse: inverse ?? [0, 0, 0] }
  }
  let point = start
  if (!solveAt(system, point)) return end(point, false, 0, 'Some of the lines stand so close together that their areas cannot be told apart.', null)
  if (!free.shift && !free.width) return end(point, true, 0, 'Shift and width are fixed: one linear solution.', null)
  const nonlinear = new ShiftAndWidth(system)
  nonlinear.linearise()
  let damping = 0
  for (let iteration = 1; iteration <= maxIterations; iteration++) {
    const step = dampedStep(nonlinear, free, damping)
    if (!step) return end(point, false, iteration, 'The lines are too weak to fix the shift and the width.', null)
    const limit = atLimit(point, free, limits)
    if (isSmall(step, Math.exp(point.logWidth))) return end(point, limit === null, iteration, limit ?? 'The next step is negligible.', nonlinear)
    const before = system.chi2
    const trial = moved(point, step, limits)
    if (solveAt(system, trial) && system.chi2 <= before) {
      const stuck = trial.shift === point.shift && trial.logWidth === point.logWidth
      point = trial
      damping = damping > 1e-6 ? damping / 10 : 0
      nonlinear.linearise()
      if (stuck) return end(point, false, iteration, limit ?? 'The fit came to a stand.', nonlinear)
      continue
    }
    const settled = system.chi2 - before <= rounding * before
    solveAt(system, point)
    if (settled) return end(point, limit === null, iteration, limit ?? 'No step lowers chi2 beyond rounding.', nonlinear)
    damping = Math.max(1e-3, damping * 10)
    if (damping > largestDamping) return end(point, false, iteration, 'No step lowers chi2.', nonlinear)
  }
  return end(point, false, maxIterations, `No convergence within ${maxIterations} steps.`, nonlinear)
}
