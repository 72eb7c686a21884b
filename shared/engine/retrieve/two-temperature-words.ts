import { printTemperature } from '../format-value'
import type { TwoTemperatureGas, TwoTemperatureResult } from '../types'

/** p as it is printed: two digits. */
function probabilityWords({ probability, draws }: TwoTemperatureResult): string {
  return `p = ${Number((probability ?? 1).toPrecision(2))} from ${draws} simulated data sets`
}

/** "41.2 K ± 1.3"; where the noise bounds a temperature on one side only (95 %), the bound: "above 113 K". */
export function gasWords({ temperature }: TwoTemperatureGas): string {
  const [low, high] = temperature.interval95
  const bound = (value: number) => `${Number(value.toPrecision(3))} K`
  if (low === null && high === null) return 'a temperature that is not bounded'
  if (high === null) return `above ${bound(low!)}`
  if (low === null) return `below ${bound(high)}`
  return printTemperature(temperature).text
}

/** Both gases in words, the cold one first; null when there are none. */
export function gasTemperatures({ gases }: TwoTemperatureResult): string | null {
  return gases && gases.map(gasWords).join(' and ')
}

/** What must be read beside a result with one temperature when two were looked for. */
export function twoTemperatureCaution(result: TwoTemperatureResult): string {
  if (result.probability === null) return `Two temperatures were not fitted: ${result.reason}`
  const temperatures = gasTemperatures(result)
  if (temperatures === null) return `Two temperatures were looked for. ${result.reason}`
  if (result.preferred) return `Two temperatures, ${temperatures}, fit the lines better than one beyond what noise explains (${probabilityWords(result)}): the single temperature then stands for neither gas. Both fits are shown; the choice is yours.`
  return `Two temperatures, ${temperatures}, fit the lines no better than noise would let them if there is one (${probabilityWords(result)}). Both fits are shown; the choice is yours.`
}
