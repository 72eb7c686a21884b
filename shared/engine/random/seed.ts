import { xoshiro128 } from './generator'
import type { GeneratorState, RandomGenerator } from './generator'

/** Largest seed: every integer up to it is a double. */
export const largestSeed = Number.MAX_SAFE_INTEGER

/** The finaliser of MurmurHash3 (A. Appleby, public domain): every input bit moves every output bit. */
function mix(word: number): number {
  let z = word | 0
  z = Math.imul(z ^ (z >>> 16), 0x85EBCA6B)
  z = Math.imul(z ^ (z >>> 13), 0xC2B2AE35)
  return z ^ (z >>> 16)
}

/**
 * Four well-mixed words from a seed and a stream number: a counter of golden-ratio steps through `mix`
 * (the way of SplitMix, Steele, Lea & Flood 2014, in 32 bits), absorbing low and high word of the seed and the stream in turn.
 *
 * @param seed integer, 0 .. 2^53 - 1
 * @param stream integer, 0 .. 2^32 - 1
 * @example
 * seedState(1).length // => 4
 */
export function seedState(seed: number, stream = 0): GeneratorState {
  const low = seed >>> 0
  const high = Math.floor(seed / 4294967296) >>> 0
  let z = mix(mix(mix(low ^ 0x9E3779B9) ^ high) ^ stream)
  const next = () => {
    z = (z + 0x9E3779B9) | 0
    return mix(mix(z ^ low) + Math.imul(high ^ stream, 0x85EBCA6B)) >>> 0
  }
  const state: GeneratorState = [next(), next(), next(), next()]
  return state.every(word => word === 0) ? [1, 0, 0, 0] : state
}

/**
 * The generator that belongs to a stored seed.
 *
 * @param seed integer, 0 .. 2^53 - 1; what is stored with a result
 * @param stream integer, 0 .. 2^32 - 1: independent numbers for part `stream` of a task (one draw, one cell of a table),
 * whatever the order in which the parts are done
 * @example
 * const first = seededGenerator(2026).uniform()
 * seededGenerator(2026).uniform() === first // => true
 * seededGenerator(2026, 1).uniform() === first // => false
 */
export function seededGenerator(seed: number, stream = 0): RandomGenerator {
  return xoshiro128(seedState(seed, stream))
}
