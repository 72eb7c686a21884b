import { strengthSetDistance } from '../diagnostics/strength-sets'
import { curvedZ, edgeFraction, poorFitProbability, shortLever, strengthSetNoise, weakLineSignalToNoise } from '../thresholds'
import type { FlagName, RetrievalResult, TemperatureValue } from '../types'

/** Flags that follow from a result with a temperature. */
export function resultFlags(result: Omit<RetrievalResult, 'flags'>, temperature: TemperatureValue, range: readonly [number, number]): FlagName[] {
  const raised: [FlagName, boolean][] = [
    ['no-test', result.dof === 0],
    ['short-lever', result.leverArm !== null && result.leverArm < shortLever],
    ['weak-line', result.weakestSignalToNoise !== null && result.weakestSignalToNoise < weakLineSignalToNoise],
    ['poor-fit', result.pValue !== null && result.pValue < poorFitProbability],
    ['curved', result.curvatureZ !== null && Math.abs(result.curvatureZ) > curvedZ],
    ['edge-of-range', temperature.value < range[0] * (1 + edgeFraction) || temperature.value > range[1] * (1 - edgeFraction)],
    ['open-interval', [...temperature.interval68, ...temperature.interval95].includes(null)],
    ['strength-sets-disagree', strengthSetDistance(result.strengthSets) > strengthSetNoise * temperature.uNoise],
  ]
  return raised.flatMap(([flag, is]) => is ? flag : [])
}
