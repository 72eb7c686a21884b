/** A whole number as superscript digits. */
export const superscript = (power: number): string => [...String(power)].map(sign => ({ '-': '⁻' })[sign] ?? '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(sign)]).join('')

/** The power of ten to take out of very large or very small values, so that ticks stay short; 0 for others. */
export function powerOf(values: (number | null)[]): number {
  const largest = values.reduce<number>((most, value) => Math.max(most, Math.abs(value ?? 0)), 0)
  const power = largest > 0 ? Math.floor(Math.log10(largest)) : 0
  return power >= 5 || power <= -3 ? power : 0
}
