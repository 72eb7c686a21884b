import { speedOfLight } from '../units/axis'

export type IntegrationAxis = 'wavelength' | 'wavenumber' | 'frequency' | 'velocity'

/** Width that 1 nm at a vacuum wavelength (nm) has on another axis: cm^-1, GHz or km/s. Exact for a line much narrower than its wavelength. */
export function areaFactor(wavelength: number, axis: IntegrationAxis): number {
  switch (axis) {
    case 'wavelength': return 1
    case 'wavenumber': return 1e7 / wavelength ** 2
    case 'frequency': return speedOfLight / wavelength ** 2
    case 'velocity': return speedOfLight / 1000 / wavelength
  }
}
