import { decimalsFor, printTemperature } from '#shared/engine/format-value'
import type { Interval, TemperatureValue } from '#shared/engine/types'

/** The parts of `T = 187.4 K ± 1.3 [2.1]`; `noise` says so in words when it is not known. */
export function temperatureParts(temperature: Pick<TemperatureValue, 'value' | 'uNoise' | 'uSystematic'>) {
  const { value, uncertainty, systematic } = printTemperature(temperature)
  return { value, noise: uncertainty ?? 'unknown', systematic }
}

export const kelvinWords = (kelvin: number): string => `${kelvin.toFixed(decimalsFor(kelvin))} K`

/** Both ends with the decimals of the noise; an open side is said in words. */
export function intervalWords([low, high]: Interval, uNoise: number | null = null): string {
  const decimals = decimalsFor(uNoise)
  const print = (end: number) => end.toFixed(decimals)
  if (low !== null && high !== null) return `${print(low)} – ${print(high)} K`
  if (high !== null) return `below ${print(high)} K, open towards lower temperatures`
  if (low !== null) return `above ${print(low)} K, open towards higher temperatures`
  return 'open on both sides'
}

/** With a sign, a true minus, and the decimals given. */
export const signed = (value: number, decimals: number): string => {
  const text = Math.abs(value).toFixed(decimals)
  if (Number(text) === 0) return text
  return `${value < 0 ? '−' : '+'}${text}`
}

/** A measured quantity beside its uncertainty; very small and very large ones with a power of ten. */
export function quantityWords(value: number, uncertainty: number | null): string {
  const size = Math.max(Math.abs(value), uncertainty ?? 0)
  if (size > 0 && (size < 1e-3 || size >= 1e7)) return value.toExponential(3).replace('-', '−').replace('e+', 'e')
  return value.toFixed(uncertainty === null ? 3 : decimalsFor(uncertainty)).replace('-', '−')
}
