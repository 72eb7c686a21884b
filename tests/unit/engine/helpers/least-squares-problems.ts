import type { LeastSquaresProblem } from '#shared/engine/optimise/types'

export interface KnownProblem { name: string, problem: LeastSquaresProblem, start: number[], minimum: number[], sumOfSquares: number }

/** A problem from residuals as a list; derivatives by differences. */
export function problemFrom(residualCount: number, list: (p: Float64Array) => number[], jacobian?: (p: Float64Array) => number[]): LeastSquaresProblem {
  return {
    residualCount,
    residuals: (p, out) => out.set(list(p)),
    ...(jacobian ? { jacobian: (p: Float64Array, out: Float64Array) => out.set(jacobian(p)) } : {}),
  }
}

/** y = a exp(-b x) at ten places, with fixed "noise" or none. */
export function decay(noise = 0): LeastSquaresProblem {
  const x = Array.from({ length: 10 }, (_, i) => i / 2)
  const y = x.map((at, i) => 5 * Math.exp(-0.7 * at) + noise * Math.sin(9 * i + 1))
  return problemFrom(10, ([a, b]) => x.map((at, i) => a * Math.exp(-b * at) - y[i]), ([a, b]) => x.flatMap(at => [Math.exp(-b * at), -a * at * Math.exp(-b * at)]))
}

const beale = [1.5, 2.25, 2.625]

/** Test functions of Moré, Garbow & Hillstrom 1981 (ACM Trans. Math. Softw. 7, 17), with their minima as printed there. */
export const knownProblems: KnownProblem[] = [
  {
    name: 'Rosenbrock',
    problem: problemFrom(2, ([a, b]) => [10 * (b - a * a), 1 - a], ([a]) => [-20 * a, 10, -1, 0]),
    start: [-1.2, 1], minimum: [1, 1], sumOfSquares: 0,
  },
  {
    name: 'Beale',
    problem: problemFrom(3, ([a, b]) => beale.map((y, i) => y - a * (1 - b ** (i + 1)))),
    start: [1, 1], minimum: [3, 0.5], sumOfSquares: 0,
  },
  {
    name: 'helical valley',
    problem: problemFrom(3, ([a, b, c]) => [10 * (c - 10 * Math.atan2(b, a) / (2 * Math.PI)), 10 * (Math.hypot(a, b) - 1), c]),
    start: [-1, 0.001, 0.5], minimum: [1, 0, 0], sumOfSquares: 0,
  },
  {
    name: 'Freudenstein and Roth, the local minimum its start leads to',
    problem: problemFrom(2, ([a, b]) => [-13 + a + ((5 - b) * b - 2) * b, -29 + a + ((b + 1) * b - 14) * b]),
    start: [0.5, -2], minimum: [11.41277900, -0.89680525], sumOfSquares: 48.98425368,
  },
  {
    name: 'Bard',
    problem: (() => {
      const y = [0.14, 0.18, 0.22, 0.25, 0.29, 0.32, 0.35, 0.39, 0.37, 0.58, 0.73, 0.96, 1.34, 2.10, 4.39]
      return problemFrom(15, ([a, b, c]) => y.map((value, i) => {
        const u = i + 1
        const v = 16 - u
        return value - (a + u / (v * b + Math.min(u, v) * c))
      }))
    })(),
    start: [1, 1, 1], minimum: [0.08241056, 1.133036092, 2.343695189], sumOfSquares: 8.21487730657e-3,
  },
]
