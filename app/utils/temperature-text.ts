import { printTemperature } from '#shared/engine/format-value'

export interface TemperatureText { value: string, uNoise: string | null, uSystematic: string | null }

/** The parts of `T = 187.4 K ± 1.3 [2.1]`, all with the same decimals. */
export function temperatureText(value: number, uNoise: number | null, uSystematic: number | null): TemperatureText {
  const { value: printed, uncertainty, systematic } = printTemperature({ value, uNoise, uSystematic })
  return { value: printed, uNoise: uncertainty, uSystematic: systematic }
}
