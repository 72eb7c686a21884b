/**
 * Refractive index of dry standard air (15 C, 101325 Pa) and the wavelength shift it causes.
 * Each formula gives n - 1 from s = (1 / vacuum wavelength in micrometres)^2; valid from 200 nm (the poles lie near 160 nm).
 */
export const airFormulaNames = ['ciddor1996', 'edlen1966', 'edlen1953', 'peck-reeder1972'] as const
export type AirFormulaName = (typeof airFormulaNames)[number]

/** Shortest wavelength at which air is taken into account, nm. Below it air is opaque and the formulas lose their meaning. */
export const shortestAirWavelength = 200

const refractivity: Record<AirFormulaName, (s: number) => number> = {
  // Ciddor 1996, Appl. Opt. 35, 1566, eq. 1 (450 ppm CO2)
  'ciddor1996': s => 0.05792105 / (238.0185 - s) + 0.00167917 / (57.362 - s),
  // Edlen 1966, Metrologia 2, 71
  'edlen1966': s => 1e-8 * (8342.13 + 2406030 / (130 - s) + 15997 / (38.9 - s)),
  // Edlen 1953, J. Opt. Soc. Am. 43, 339
  'edlen1953': s => 1e-8 * (6432.8 + 2949810 / (146 - s) + 25540 / (41 - s)),
  // Peck & Reeder 1972, J. Opt. Soc. Am. 62, 958
  'peck-reeder1972': s => 1e-8 * (8060.51 + 2480990 / (132.274 - s) + 17455.7 / (39.32957 - s)),
}

/** n of air at a vacuum wavelength in nm. */
export function airIndex(vacuumNanometre: number, formula: AirFormulaName): number {
  return 1 + refractivity[formula]((1000 / vacuumNanometre) ** 2)
}

/** Vacuum nm to air nm. */
export function vacuumToAir(vacuumNanometre: number, formula: AirFormulaName): number {
  return vacuumNanometre / airIndex(vacuumNanometre, formula)
}

/** Air nm to vacuum nm: fixed-point iteration, each round gains four digits or more; ends at 1e-14 relative. */
export function airToVacuum(airNanometre: number, formula: AirFormulaName): number {
  let vacuum = airNanometre * airIndex(airNanometre, formula)
  for (let round = 0; round < 20; round++) {
    const next = airNanometre * airIndex(vacuum, formula)
    if (Math.abs(next - vacuum) <= 1e-14 * next) return next
    vacuum = next
  }
  return vacuum
}

/** Vacuum minus air wavelength, nm, at a vacuum wavelength in nm. */
export function airShift(vacuumNanometre: number, formula: AirFormulaName = 'ciddor1996'): number {
  return vacuumNanometre - vacuumToAir(vacuumNanometre, formula)
}
