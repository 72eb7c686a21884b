/** Lanczos coefficients, g = 607/128, n = 15 (P. Godfrey 2001; relative error about 1e-15). */
const g = 607 / 128
const coefficients = [
  0.99999999999999709182, 57.156235665862923517, -59.597960355475491248, 14.136097974741747174, -0.49191381609762019978,
  0.33994649984811888699e-4, 0.46523628927048575665e-4, -0.98374475304879564677e-4, 0.15808870322491248884e-3, -0.21026444172410488319e-3,
  0.21743961811521264320e-3, -0.16431810653676389022e-3, 0.84418223983852743293e-4, -0.26190838401581408670e-4, 0.36899182659531622704e-5,
]

/**
 * ln Gamma(x), x > 0. Above 10 Stirling's series, below Lanczos's sum.
 * Error about 1e-14 of max(1, |ln Gamma|).
 */
export function logGamma(x: number): number {
  if (x >= 10) return (x - 0.5) * Math.log(x) - x + 0.5 * Math.log(2 * Math.PI) + stirlingError(x)
  let sum = coefficients[0]
  for (let i = 1; i < coefficients.length; i++) sum += coefficients[i] / (x - 1 + i)
  const t = x - 0.5 + g
  return (x - 0.5) * Math.log(t) - t + Math.log(Math.sqrt(2 * Math.PI) * sum)
}

/**
 * ln Gamma(x) - [(x - 1/2) ln x - x + ln(2 pi)/2], x > 0: what Stirling's formula leaves out.
 * Series of Abramowitz & Stegun 6.1.41 above 16 (error < 1e-17), recurrence below.
 */
export function stirlingError(x: number): number {
  if (x < 16) {
    // The same expression at x and x + 1 differ by (x + 1/2) ln(1 + 1/x) - 1.
    return stirlingError(x + 1) + (x + 0.5) * Math.log1p(1 / x) - 1
  }
  const q = 1 / (x * x)
  return (1 / 12 - q * (1 / 360 - q * (1 / 1260 - q * (1 / 1680 - q * (1 / 1188 - q * (691 / 360360 - q / 156)))))) / x
}
