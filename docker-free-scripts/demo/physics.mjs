/** hc/k in cm K (exact SI, CODATA 2018). */
export const C2 = 1.438776877

/** Wavelength in air of a vacuum wavelength, nm (Ciddor 1996, Appl. Opt. 35, 1566, eq. 1: 15 C, 450 ppm CO2). */
export function airOf(vacuumNm) {
  const s2 = (1000 / vacuumNm) ** 2
  return vacuumNm / (1 + 5792105e-8 / (238.0185 - s2) + 167917e-8 / (57.362 - s2))
}

/** Photons of one component of an emission line, relative: A g exp(-E/kT). */
export const photonStrength = (component, strengthSet, temperature) =>
  (component.strengths[strengthSet] ?? 0) * component.gUpper * Math.exp(-C2 * component.termUpper / temperature)

/** Rayleigh-Jeans brightness integral of one optically thin line before a background, relative. */
export function brightness(component, strengthSet, temperature, background) {
  const { wavenumber, gUpper, termUpper, strengths } = component
  const ratio = Math.expm1(C2 * wavenumber / temperature) / Math.expm1(C2 * wavenumber / background)
  return strengths[strengthSet] * gUpper / wavenumber ** 2 * Math.exp(-C2 * termUpper / temperature) * (1 - ratio)
}
