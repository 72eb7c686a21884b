import { C2 } from '../constants'
import type { Interval } from '../types'

/** An energy level: term energy cm^-1, total degeneracy. */
export interface Level { energy: number, degeneracy: number }

/**
 * Estimator 6: T = (2 hcB/k) (J_max + 1/2)^2, where the population (2J+1) exp(-hcB J(J+1)/kT) of a rigid rotor peaks at J_max; K.
 *
 * @param B rotational constant, cm^-1
 */
export function temperatureFromStrongestJ(B: number, Jmax: number): number {
  return 2 * C2 * B * (Jmax + 0.5) ** 2
}

/**
 * The T at which two levels are equally populated: C2 (E_b - E_a) / ln(g_b / g_a), K.
 *
 * @returns null when they are so at no positive T
 */
export function equalPopulationTemperature(a: Level, b: Level): number | null {
  const temperature = C2 * (b.energy - a.energy) / Math.log(b.degeneracy / a.degeneracy)
  return temperature > 0 && Number.isFinite(temperature) ? temperature : null
}

/**
 * Exact interval of T in which level `strongest` holds more than its neighbours in a ladder of levels of ascending energy:
 * from N(J) = N(J-1) to N(J) = N(J+1). An end without neighbour is open.
 */
export function strongestLevelInterval(levels: readonly Level[], strongest: number): Interval {
  const below = levels[strongest - 1]
  const above = levels[strongest + 1]
  return [
    below ? equalPopulationTemperature(below, levels[strongest]) : null,
    above ? equalPopulationTemperature(levels[strongest], above) : null,
  ]
}
