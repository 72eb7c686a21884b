/** Decimals that show an uncertainty with two significant digits (one from 10 on), 0..6. */
export function decimalsFor(uncertainty: number | null): number {
  if (uncertainty == null || !(uncertainty > 0)) return 1
  return Math.min(6, Math.max(0, 1 - Math.floor(Math.log10(uncertainty))))
}

export interface TemperatureText { value: string, uNoise: string | null, uSystematic: string | null }

/** The parts of `T = 187.4 K ± 1.3 [2.1]`, all with the same decimals. */
export function temperatureText(value: number, uNoise: number | null, uSystematic: number | null): TemperatureText {
  const decimals = decimalsFor(uNoise || uSystematic)
  const print = (number: number | null) => number == null ? null : number.toFixed(decimals)
  return { value: value.toFixed(decimals), uNoise: print(uNoise), uSystematic: uSystematic ? print(uSystematic) : null }
}
