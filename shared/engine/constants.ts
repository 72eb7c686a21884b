/** A physical constant with its unit and where the number comes from. */
export interface PhysicalConstant { value: number, unit: string, source: string }

const si = 'SI Brochure 9th edition (2019), exact; CODATA 2018 and 2022'

export const speedOfLight: PhysicalConstant = { value: 299792458, unit: 'm s^-1', source: si }
export const planckConstant: PhysicalConstant = { value: 6.62607015e-34, unit: 'J s', source: si }
export const boltzmannConstant: PhysicalConstant = { value: 1.380649e-23, unit: 'J K^-1', source: si }

/** Second radiation constant hc/k: turns a term energy in cm^-1 into kelvin. */
export const secondRadiationConstant: PhysicalConstant = {
  value: 100 * planckConstant.value * speedOfLight.value / boltzmannConstant.value,
  unit: 'cm K',
  source: `hc/k of exact constants: ${si}`,
}

/** hc/k, cm K */
export const C2 = secondRadiationConstant.value
