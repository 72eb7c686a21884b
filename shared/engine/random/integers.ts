import type { RandomGenerator } from './generator'

/**
 * A whole number from 0 to below - 1, all equally likely: bits beyond the last whole multiple of `below` are drawn again.
 *
 * @param below integer, 1 .. 2^32
 * @example
 * integerBelow(seededGenerator(1), 1) // => 0
 */
export function integerBelow(generator: RandomGenerator, below: number): number {
  const usable = 4294967296 - 4294967296 % below
  for (;;) {
    const bits = generator.bits()
    if (bits < usable) return bits % below
  }
}

/**
 * Indices of a bootstrap sample: `count` draws with replacement from 0 .. count - 1 (Efron 1979).
 *
 * @param out receives the indices
 * @example
 * bootstrapIndices(seededGenerator(1), 1) // => [0]
 */
export function bootstrapIndices(generator: RandomGenerator, count: number, out: Int32Array = new Int32Array(count)): Int32Array {
  for (let i = 0; i < count; i++) out[i] = integerBelow(generator, count)
  return out
}
