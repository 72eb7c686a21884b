import type { AxisMedium, AxisUnit, ValueKind } from '#shared/types/spectrum'

export const axisUnitWords: Record<AxisUnit, string> = {
  'nm': 'nanometre', 'angstrom': 'angstrom', 'um': 'micrometre', 'cm-1': 'wavenumber, cm⁻¹', 'GHz': 'gigahertz', 'MHz': 'megahertz', 'Hz': 'hertz', 'pixel': 'pixel number',
}

export const mediumWords: Record<AxisMedium, string> = { vacuum: 'vacuum', air: 'air' }

export const valueKindWords: Record<ValueKind, string> = { photons: 'photons', energy: 'energy' }
