import type { LeastSquaresOptions } from './types'

/** Options with every default filled in. */
export interface ResolvedOptions extends Required<Omit<LeastSquaresOptions, 'lower' | 'upper' | 'scale'>> {
  lower: Float64Array
  upper: Float64Array
  scale: Float64Array
}

/** The one place where defaults stand; `types.ts` quotes them and a test compares the two. */
export const defaultOptions = {
  noise: 'relative',
  maxIterations: 1000,
  offsetTolerance: 1e-12,
  stepTolerance: 1e-12,
  reductionTolerance: 1e-15,
  damping: 1e-2,
  polishSteps: 20,
} as const

/** `scale` where none is given: this part of |start|. */
export const defaultScalePart = 1e-4

/**
 * Fills in defaults; bounds and scales become arrays of length n.
 *
 * @param start length n
 * @example
 * resolveOptions({ polishSteps: 0 }, [2, -3]).polishSteps // => 0
 * resolveOptions({}, [2, -3]).scale // => [2e-4, 3e-4]
 */
export function resolveOptions(options: LeastSquaresOptions, start: ArrayLike<number>): ResolvedOptions {
  const n = start.length
  const given = Object.fromEntries(Object.entries(options).filter(([, value]) => value !== undefined)) as LeastSquaresOptions
  return {
    stop: () => false,
    ...defaultOptions,
    ...given,
    lower: given.lower ? Float64Array.from(given.lower) : new Float64Array(n).fill(-Infinity),
    upper: given.upper ? Float64Array.from(given.upper) : new Float64Array(n).fill(Infinity),
    scale: given.scale ? Float64Array.from(given.scale) : Float64Array.from(start, value => defaultScalePart * Math.abs(value)),
  }
}

const isPositive = (value: number) => value > 0 && value < Infinity
const isTolerance = (value: number) => value >= 0 && value < 1
const isCount = (value: number) => Number.isInteger(value) && value >= 0

/**
 * What is wrong with an input, in words; null when nothing is.
 *
 * @param start length n
 * @param residualCount m
 * @example
 * inputProblem([1, 2], 1, resolveOptions({}, [1, 2])) // => '1 residuals do not determine 2 parameters.'
 */
export function inputProblem(start: ArrayLike<number>, residualCount: number, options: ResolvedOptions): string | null {
  const n = start.length
  const { lower, upper } = options
  if (n === 0) return 'There is no parameter to fit.'
  if (!isCount(residualCount) || residualCount < n) return `${residualCount} residuals do not determine ${n} parameters.`
  for (let j = 0; j < n; j++) if (!Number.isFinite(start[j])) return `The start of parameter ${j + 1} is not a finite number.`
  if (lower.length !== n || upper.length !== n) return 'The bounds are not as many as the parameters.'
  for (let j = 0; j < n; j++) if (!(lower[j] <= upper[j])) return `The lower bound of parameter ${j + 1} is not below its upper bound.`
  if (options.scale.length !== n || !options.scale.every(value => value >= 0 && value < Infinity)) return 'The scales are not one finite number of at least 0 for each parameter.'
  if (![options.offsetTolerance, options.stepTolerance, options.reductionTolerance].every(isTolerance)) return 'A tolerance is not between 0 and 1.'
  if (!isPositive(options.damping)) return 'The damping is not a positive number.'
  if (!isCount(options.maxIterations) || !isCount(options.polishSteps)) return 'A number of steps is not a whole number.'
  return null
}
