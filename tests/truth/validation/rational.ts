/** Exact rational arithmetic on BigInt, for linear least squares without rounding. */
export interface Rational { n: bigint, d: bigint }

function gcd(a: bigint, b: bigint): bigint {
  while (b !== 0n) [a, b] = [b, a % b]
  return a < 0n ? -a : a
}

function reduced(n: bigint, d: bigint): Rational {
  const g = gcd(n, d)
  return d < 0n ? { n: -n / g, d: -d / g } : { n: n / g, d: d / g }
}

export const zero: Rational = { n: 0n, d: 1n }
export const plus = (a: Rational, b: Rational) => reduced(a.n * b.d + b.n * a.d, a.d * b.d)
export const times = (a: Rational, b: Rational) => reduced(a.n * b.n, a.d * b.d)
export const minus = (a: Rational, b: Rational) => reduced(a.n * b.d - b.n * a.d, a.d * b.d)
export const over = (a: Rational, b: Rational) => reduced(a.n * b.d, a.d * b.n)

/** A decimal such as "-6.86e-3", exactly. */
export function fromDecimal(text: string): Rational {
  const [, sign, whole, fraction = '', exponent = '0'] = /^([+-]?)(\d+)\.?(\d*)(?:[eE]([+-]?\d+))?$/.exec(text.trim())!
  const power = BigInt(Number(exponent) - fraction.length)
  const digits = BigInt(`${sign === '-' ? '-' : ''}${whole}${fraction}`)
  return power < 0n ? reduced(digits, 10n ** -power) : reduced(digits * 10n ** power, 1n)
}

/** The nearest double, to a unit of its last place: 25 digits, then parsed. */
export function toNumber({ n, d }: Rational): number {
  if (n === 0n) return 0
  const size = String(n < 0n ? -n : n).length - String(d).length
  const shift = 25 - size
  const digits = shift >= 0 ? n * 10n ** BigInt(shift) / d : n / (d * 10n ** BigInt(-shift))
  return Number(`${digits}e${-shift}`)
}

export interface ExactFit { parameters: number[], errors: number[], sumOfSquares: number, residualDeviation: number }

/** Least squares by normal equations without any rounding; rows of `a` are observations. */
export function exactLeastSquares(a: Rational[][], y: Rational[]): ExactFit {
  const p = a[0].length
  const sum = (pick: (row: Rational[], i: number) => Rational) => a.reduce((total, row, i) => plus(total, pick(row, i)), zero)
  const normal = Array.from({ length: p }, (_, j) => Array.from({ length: p }, (_, k) => sum(row => times(row[j], row[k]))))
  const right = Array.from({ length: p }, (_, j) => sum((row, i) => times(row[j], y[i])))
  const inverse = inverted(normal)
  const parameters = inverse.map(row => row.reduce((total, entry, k) => plus(total, times(entry, right[k])), zero))
  const squares = y.reduce((total, value) => plus(total, times(value, value)), zero)
  const sumOfSquares = parameters.reduce((rest, value, j) => minus(rest, times(value, right[j])), squares)
  const variance = over(sumOfSquares, { n: BigInt(a.length - p), d: 1n })
  return {
    parameters: parameters.map(toNumber),
    errors: inverse.map((row, j) => Math.sqrt(toNumber(times(row[j], variance)))),
    sumOfSquares: toNumber(sumOfSquares),
    residualDeviation: Math.sqrt(toNumber(variance)),
  }
}

/** Gauss-Jordan; pivots of a positive definite matrix are never zero. */
function inverted(matrix: Rational[][]): Rational[][] {
  const p = matrix.length
  const rows = matrix.map((row, i) => [...row, ...row.map((_, j): Rational => ({ n: i === j ? 1n : 0n, d: 1n }))])
  for (let k = 0; k < p; k++) {
    rows[k] = rows[k].map(entry => over(entry, rows[k][k]))
    for (let i = 0; i < p; i++) {
      if (i !== k) rows[i] = rows[i].map((entry, j) => minus(entry, times(rows[i][k], rows[k][j])))
    }
  }
  return rows.map(row => row.slice(p))
}
