import { faddeeva } from '#shared/engine/special/faddeeva'
import { chiSquareCdf, chiSquareQuantile, chiSquareTail } from '#shared/engine/statistics/chi-square'
import { erfc } from '#shared/engine/statistics/erf'
import { fisherCdf, fisherQuantile, fisherTail } from '#shared/engine/statistics/fisher-f'
import { normalQuantile } from '#shared/engine/statistics/normal'
import { studentQuantile, studentTail } from '#shared/engine/statistics/student-t'
import { runPython } from '../../python/run-python'
import { relativeError } from '../digits'
import type { Check, Section } from '../report'

type Call = [name: string, arguments: number[]]

const pairs = <A, B>(a: readonly A[], b: readonly B[]) => a.flatMap(x => b.map(y => [x, y] as const))
const degrees = [1, 2, 3, 5, 10, 30, 100, 1000]
const degreePairs = pairs(degrees, degrees)
/** Smaller values are denormal, or nearly: they have no 12 digits. */
const smallest = 1e-300

/** Functions and the arguments at which they are compared with scipy, where scipy itself holds 1e-12. */
const usual: Record<string, [(...x: number[]) => number, number[][]]> = {
  erfc: [erfc, [-26, -5, -1, -0.1, 0, 1e-5, 0.1, 0.5, 1, 2, 3, 5, 8, 12, 18, 22, 26].map(x => [x])],
  chiSquareCdf: [chiSquareCdf, pairs(degrees, [1e-12, 1e-3, 0.1, 0.5, 1, 2, 5]).map(([n, r]) => [n * r, n])],
  chiSquareTail: [chiSquareTail, pairs(degrees, [1e-3, 0.1, 0.5, 1, 2, 5, 20, 100, 600]).map(([n, r]) => [n * r, n])],
  studentTail: [studentTail, pairs([-1e10, -30, -2, 0, 1e-8, 0.1, 1, 3, 10, 100, 1e4, 1e10, 1e100], degrees).map(([t, n]) => [t, n])],
  fisherTail: [fisherTail, pairs([0.1, 1, 3, 10, 100], degreePairs).map(([x, [m, n]]) => [x, m, n])],
}

/** The same and more against exact series, out to tails of 1e-300. */
const extreme: Record<string, [(...x: number[]) => number, number[][]]> = {
  ...usual,
  fisherTail: [fisherTail, pairs([1e-10, 1e-3, 0.1, 1, 3, 10, 100, 1e6, 1e20], degreePairs).map(([x, [m, n]]) => [x, m, n])],
  fisherCdf: [fisherCdf, pairs([1e-100, 1e-10, 1e-3, 0.1, 1, 3, 10, 1e6], degreePairs).map(([x, [m, n]]) => [x, m, n])],
}

const probabilities = [1e-300, 1e-100, 1e-30, 1e-10, 1e-3, 0.1, 0.3, 0.6827, 0.9, 0.9545, 0.999]
const inRange = (x: number) => Math.abs(x) > 1e-290 && Math.abs(x) < 1e290

/** Quantiles with the call that tells whether the exact distribution passes the probability within 1e-12 of each. */
const quantiles: Record<string, () => Call[]> = {
  normalQuantile: () => probabilities.map((p): Call => ['normalTailBrackets', [-normalQuantile(p), p]]),
  chiSquareQuantile: () => pairs(probabilities, degrees).flatMap(([p, n]): Call[] => [
    ['chiSquareCdfBrackets', [chiSquareQuantile(p, n), p, n]],
    ['chiSquareTailBrackets', [chiSquareQuantile(1 - p, n, p), p, n]],
  ]),
  studentQuantile: () => pairs(probabilities, degrees).map(([p, n]): Call => ['studentTailBrackets', [studentQuantile(1 - p, n, p), p, n]]),
  fisherQuantile: () => pairs(probabilities, degreePairs).flatMap(([p, [m, n]]): Call[] => [
    ['fisherCdfBrackets', [fisherQuantile(p, m, n), p, m, n]],
    ['fisherTailBrackets', [fisherQuantile(1 - p, m, n, p), p, m, n]],
  ]),
}

interface Comparison { name: string, against: string, calls: number, worst: number, bar: number }

/** Exact series are slow: the gate takes every fifth call. */
const thinned = <T>(list: readonly T[], size: 'gate' | 'full') => list.filter((_, i) => size === 'full' || i % 5 === 0)

function compare(functions: typeof usual, script: string, against: string, size: 'gate' | 'full'): Comparison[] {
  const calls = Object.entries(functions).flatMap(([name, [, lists]]) => thinned(lists, size).map((list): Call => [name, list]))
  const truth = runPython<number[]>(script, calls)
  return Object.entries(functions).map(([name, [run]]) => {
    const errors = calls.flatMap(([of, list], i) => of === name && truth[i] > smallest ? relativeError(run(...list), truth[i]) : [])
    return { name, against, calls: errors.length, worst: Math.max(...errors), bar: 1e-12 }
  })
}

function bracketed(size: 'gate' | 'full'): Comparison[] {
  return Object.entries(quantiles).map(([name, list]) => {
    const calls = thinned(list().filter(([, [x]]) => inRange(x)), size)
    const inside = runPython<number[]>('exact_tails.py', calls)
    // The answer is yes or no: the worst error is known only to be below the bar.
    return { name, against: 'exact series', calls: calls.length, worst: inside.every(Boolean) ? 1e-12 : 1, bar: 1e-12 }
  })
}

const waves = pairs([0, 1e-6, 0.013, 0.3, 0.9, 1.7, 2.6, 3.4, 4.1, 5.2, 6.3, 7.4], [0, 1e-12, 1e-6, 1e-3, 0.07, 0.6, 1.8, 3.3, 6.7]).map(([x, y]) => [x, y])

function faddeevaComparisons(): Comparison[] {
  const compareWith = (how: 'scipy' | 'exact', part: number, name: string, bar: number): Comparison => {
    const truth = runPython<number[][]>('faddeeva.py', { how, points: waves })
    const errors = waves.flatMap(([x, y], i) => Math.abs(truth[i][part]) > smallest ? relativeError(faddeeva(x, y)[part], truth[i][part]) : [])
    return { name, against: how === 'exact' ? 'exact series' : 'scipy', calls: errors.length, worst: Math.max(...errors), bar }
  }
  return [
    compareWith('scipy', 0, 'faddeeva, real part', 1e-12), compareWith('scipy', 1, 'faddeeva, imaginary part', 1e-12),
    compareWith('exact', 0, 'faddeeva, real part', 1e-12), compareWith('exact', 1, 'faddeeva, imaginary part', 1e-12),
    compareWith('exact', 2, 'faddeeva, slope of the profile', 1e-11),
  ]
}

export const section: Section = {
  order: 20,
  title: 'Special functions',
  about: `Distribution functions and the Faddeeva function (\`shared/engine/statistics\`, \`shared/engine/special\`) against scipy where scipy
holds 1e-12, and against power series in decimals of 480 (w(z): 140) digits, with tails down to 1e-300. For quantiles the exact distribution
function must pass the probability within 1e-12 of the value. Degrees of freedom 1 to 1000. scipy itself is further away in places:
its F and t quantiles hold 1e-9, and its F tails near 0 and 1 as little.`,
  run: (size) => {
    const comparisons = [...compare(usual, 'special_functions.py', 'scipy', 'full'), ...compare(extreme, 'exact_tails.py', 'exact series', size), ...bracketed(size), ...faddeevaComparisons()]
    const checks = comparisons.flatMap(({ name, against, calls, worst, bar }): Check[] => [
      { what: `${name} against ${against}: relative error`, found: worst, bar, sense: 'most' },
      { what: `${name} against ${against}: calls`, found: calls, bar: 2, sense: 'least' },
    ])
    const rows = comparisons.map(({ name, against, calls, worst, bar }) => [name, against, String(calls), worst === bar ? `< ${bar}` : worst.toExponential(1), String(bar)])
    return { tables: [{ columns: ['function', 'compared with', 'calls', 'largest relative error', 'required'], rows }], checks }
  },
}
