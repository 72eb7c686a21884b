import { decimalsFor } from '#shared/engine/format-value'
import type { RetrievalResult } from '#shared/engine/types'
import { signed } from './number-words'

export interface StrengthSetRow { name: string, temperature: string, change: string, chosen: boolean, comparisonOnly: boolean }

/** The result's own set first, then what the same lines give under each other set. */
export function strengthSetRows({ temperature, strengthSet, strengthSets }: Pick<RetrievalResult, 'temperature' | 'strengthSet' | 'strengthSets'>): StrengthSetRow[] {
  if (!temperature || !strengthSet) return []
  const decimals = decimalsFor(temperature.uNoise || temperature.uSystematic)
  const own = { name: strengthSet, temperature: temperature.value.toFixed(decimals), change: '', chosen: true, comparisonOnly: false }
  const others = strengthSets.filter(({ name }) => name !== strengthSet).map(({ name, temperature: value, comparisonOnly }) => ({
    name,
    temperature: value === null ? 'no value' : value.toFixed(decimals),
    change: value === null ? '' : signed(value - temperature.value, decimals),
    chosen: false,
    comparisonOnly: comparisonOnly ?? false,
  }))
  return [own, ...others]
}
