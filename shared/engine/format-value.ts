/**
 * Numbers as people see them: page, mail and table print through here, so that their digits agree.
 */

/** Decimals that show an uncertainty with two significant digits (JCGM 100:2008, 7.2.6); none from 10 on, six at the most, one when it is not known. */
export function decimalsFor(uncertainty: number | null | undefined): number {
  if (uncertainty == null || !(uncertainty > 0) || !Number.isFinite(uncertainty)) return 1
  // Rounded first: 0.0996 is 0.10, not 0.100.
  const rounded = Number(uncertainty.toPrecision(2))
  return Math.min(6, Math.max(0, 1 - Math.floor(Math.log10(rounded))))
}

export interface PrintedTemperature {
  /** "187.4" */
  value: string
  /** "1.3"; null when not known. */
  uncertainty: string | null
  /** "2.1"; null when there is none. */
  systematic: string | null
  /** "187.4 K ± 1.3" */
  text: string
}

/**
 * A temperature and its uncertainties, K, all with the decimals of the noise (or of the systematic part where there is no noise).
 * `decimals` overrides, for a bound that stands beside another number.
 *
 * @example
 * printTemperature({ value: 187.43, uNoise: 1.27 }).text // => '187.4 K ± 1.3'
 */
export function printTemperature(
  { value, uNoise = null, uSystematic = null }: { value: number, uNoise?: number | null, uSystematic?: number | null },
  decimals = decimalsFor(uNoise || uSystematic),
): PrintedTemperature {
  const print = (number: number | null) => number ? number.toFixed(decimals) : null
  const printed = value.toFixed(decimals)
  const uncertainty = print(uNoise)
  return { value: printed, uncertainty, systematic: print(uSystematic), text: uncertainty ? `${printed} K ± ${uncertainty}` : `${printed} K` }
}
