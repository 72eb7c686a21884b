/** AICc is shown from this many lines on; with fewer it is infinite or means nothing. */
export const informationLines = 8

/**
 * Akaike's information criterion with the correction for few data (Hurvich & Tsai 1989, Biometrika 76, 297).
 * Known noise: chi2 + 2 k + 2 k (k + 1) / (n - k - 1); noise known up to a factor: n ln(chi2 / n) in place of chi2, the factor counted as one more unknown.
 *
 * @param n lines
 * @param k unknowns
 * @returns null below eight lines, and where the correction has no finite value
 * @example
 * correctedAkaike(12.5, 10, 2, true) // => 12.5 + 4 + 12 / 7
 * correctedAkaike(12.5, 7, 2, true) // => null
 */
export function correctedAkaike(chi2: number, n: number, k: number, noiseKnown: boolean): number | null {
  const unknowns = noiseKnown ? k : k + 1
  const left = n - unknowns - 1
  if (n < informationLines || left <= 0 || !(noiseKnown || chi2 > 0)) return null
  return (noiseKnown ? chi2 : n * Math.log(chi2 / n)) + 2 * unknowns + 2 * unknowns * (unknowns + 1) / left
}
