import { deviance } from '../statistics/saddle-point'
import { stirlingError } from '../statistics/log-gamma'
import type { RandomGenerator } from './generator'

/** From this mean on by transformed rejection; below by multiplication. */
const largeMean = 10

/**
 * A Poisson count of the given mean.
 * Below 10 by multiplying uniforms (Knuth, The Art of Computer Programming 2, 3.4.1); above by transformed rejection,
 * algorithm PTRS of Hörmann (1993, Insurance: Mathematics and Economics 12, 39).
 *
 * @param mean counts, 0 .. 1e15; 0 and less give 0
 * @example
 * poissonCount(seededGenerator(3), 0) // => 0
 */
export function poissonCount(generator: RandomGenerator, mean: number): number {
  if (!(mean > 0)) return 0
  return mean < largeMean ? byMultiplication(generator, mean) : byTransformedRejection(generator, mean)
}

function byMultiplication(generator: RandomGenerator, mean: number): number {
  const end = Math.exp(-mean)
  let product = generator.uniform()
  let count = 0
  while (product > end) {
    product *= generator.uniform()
    count++
  }
  return count
}

/** Constants a, b, v_r of the table mountain hat: Hörmann 1993, section 4. */
function byTransformedRejection(generator: RandomGenerator, mean: number): number {
  const b = 0.931 + 2.53 * Math.sqrt(mean)
  const a = -0.059 + 0.02483 * b
  const vr = 0.9277 - 3.6224 / (b - 2)
  const invAlpha = 1.1239 + 1.1328 / (b - 3.4)
  for (;;) {
    const u = generator.uniform() - 0.5
    const v = 1 - generator.uniform()
    const us = 0.5 - Math.abs(u)
    const k = Math.floor((2 * a / us + b) * u + mean + 0.43)
    if (us >= 0.07 && v <= vr) return k
    if (k < 0 || (us < 0.013 && v > us)) continue
    if (Math.log(v * invAlpha / (a / (us * us) + b)) <= logProbability(k, mean)) return k
  }
}

/** ln(e^-m m^k / k!) in Loader's form, which keeps its digits at large counts. */
function logProbability(k: number, mean: number): number {
  return k === 0 ? -mean : -stirlingError(k) - deviance(k, mean) - 0.5 * Math.log(2 * Math.PI * k)
}
