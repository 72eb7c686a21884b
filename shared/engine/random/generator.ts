/** A source of seeded random numbers; the same seed gives the same numbers on every machine. */
export interface RandomGenerator {
  /** The next 32 bits as an integer, 0 .. 2^32 - 1. */
  bits: () => number
  /** Uniform in [0, 1), 53 bits. */
  uniform: () => number
}

/** State words of the generator. */
export type GeneratorState = [number, number, number, number]

/**
 * xoshiro128** 1.1 (Blackman & Vigna 2021, ACM Trans. Math. Softw. 47, 36): period 2^128 - 1, no known statistical defect.
 * 32-bit integer arithmetic alone, so that every bit is the same everywhere.
 *
 * @param state four 32-bit words, not all zero
 * @example
 * const reference = xoshiro128([1, 2, 3, 4])
 * reference.bits() // => 11520
 */
export function xoshiro128(state: Readonly<GeneratorState>): RandomGenerator {
  let [a, b, c, d] = state.map(word => word | 0)
  const bits = () => {
    const product = Math.imul(b, 5)
    const result = Math.imul((product << 7) | (product >>> 25), 9)
    const shifted = b << 9
    c ^= a
    d ^= b
    b ^= c
    a ^= d
    c ^= shifted
    d = (d << 11) | (d >>> 21)
    return result >>> 0
  }
  // 27 and 26 bits: the top ones, which are the best mixed.
  const uniform = () => ((bits() >>> 5) * 67108864 + (bits() >>> 6)) / 9007199254740992
  return { bits, uniform }
}
