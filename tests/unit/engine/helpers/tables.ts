import type { LineComponent, LineRetrievalInput, MeasuredLine, ObservableReading } from '#shared/engine/types'

/** hc/k in cm K, CODATA 2018: 1.438776877... e-2 m K (exact); more digits from its definition. */
export const secondRadiation = 100 * 6.62607015e-34 * 299792458 / 1.380649e-23

/** Every observable with every way of reading it. */
export const readings: ObservableReading[] = [
  { observable: 'photon-emission' },
  { observable: 'energy-emission' },
  { observable: 'brightness-integral', backgroundTemperature: 0 },
  { observable: 'brightness-integral', backgroundTemperature: 2.725 },
  { observable: 'absorption-area' },
  { observable: 'optical-depth-integral' },
  { observable: 'equivalent-width', widthIn: 'wavelength' },
  { observable: 'equivalent-width', widthIn: 'wavenumber' },
  { observable: 'equivalent-width', widthIn: 'velocity' },
  { observable: 'level-population', populationPer: 'level' },
  { observable: 'level-population', populationPer: 'state' },
  { observable: 'raman-scatter', signalIn: 'photons' },
  { observable: 'raman-scatter', signalIn: 'energy' },
  { observable: 'envelope-only' },
]

export const nameOf = (reading: ObservableReading) => [reading.observable, reading.populationPer, reading.widthIn, reading.signalIn, reading.backgroundTemperature].filter(part => part !== undefined).join(' ')

/** Invented rigid-rotor lines J -> J - 1 of rotational constant B (cm^-1), J = 1 .. count; Stokes data on each for the Raman reading. */
export function rotorLines(count: number, B: number): { label: string, band: string, components: LineComponent[] }[] {
  return Array.from({ length: count }, (_, i) => {
    const J = i + 1
    const component: LineComponent = {
      wavenumber: 2 * B * J,
      termUpper: B * J * (J + 1),
      termLower: B * J * (J - 1),
      gUpper: 2 * J + 1,
      gLower: 2 * J - 1,
      einsteinA: 1e-7 * J ** 4 / (2 * J + 1),
      raman: { scatteredWavenumber: 18797 - B * (4 * i + 6), spinWeight: J % 2 ? 6 : 3, J: J - 1, branch: 'stokes' },
    }
    return { label: `R${i}`, band: 'ground', components: [component] }
  })
}

/** The model of design table 2, written out from its formulas; independent of the engine's code. Energies as given, no guard. */
export function tableModel(reading: ObservableReading, c: LineComponent, T: number): number {
  const { observable, backgroundTemperature: Tbg = 0, populationPer, widthIn, signalIn } = reading
  const v = c.wavenumber
  const x = (energy: number) => secondRadiation * energy / T
  const absorbed = Math.exp(-x(c.termLower)) * -Math.expm1(-x(v))
  const emitted = Math.exp(-x(c.termUpper))
  switch (observable) {
    case 'photon-emission': return c.einsteinA * c.gUpper * emitted
    case 'energy-emission': return c.einsteinA * c.gUpper * v * emitted
    case 'brightness-integral': return c.einsteinA * c.gUpper / v ** 2 * emitted * (1 - (Tbg === 0 ? 0 : Math.expm1(x(v)) / Math.expm1(secondRadiation * v / Tbg)))
    case 'absorption-area': return c.einsteinA * c.gUpper / v ** 2 * absorbed
    case 'optical-depth-integral': return c.einsteinA * c.gUpper / v ** 3 * absorbed
    case 'equivalent-width': return c.einsteinA * c.gUpper * (1 / v) ** { wavelength: 4, wavenumber: 2, velocity: 3 }[widthIn!] * absorbed
    case 'level-population': return (populationPer === 'level' ? c.gUpper : 1) * emitted
    case 'raman-scatter': {
      const { J, scatteredWavenumber, spinWeight, branch } = c.raman!
      const X = branch === 'stokes' ? (J + 1) * (J + 2) / (2 * J + 3) : J * (J - 1) / (2 * J - 1)
      return spinWeight * X * scatteredWavenumber ** (signalIn === 'photons' ? 3 : 4) * Math.exp(-x(branch === 'stokes' ? c.termLower : c.termUpper))
    }
    case 'envelope-only': return c.raman?.branch === 'stokes' ? c.gLower * Math.exp(-x(c.termLower)) : c.gUpper * emitted
  }
}

export interface SyntheticTable {
  reading?: ObservableReading
  temperature: number
  lines?: { label: string, band: string, components: LineComponent[] }[]
  scale?: number
  /** sigma = relative x intensity, unless `sigma` is given. */
  relative?: number
  sigma?: number
  /** Standard normal numbers to add as noise. */
  normal?: () => number
}

/** A table of lines whose intensities follow the model, with or without noise. */
export function syntheticInput({ reading = { observable: 'photon-emission' }, temperature, lines = rotorLines(6, 1.93), scale = 1, relative = 0.01, sigma, normal }: SyntheticTable): LineRetrievalInput {
  const measured = lines.map((line): MeasuredLine => {
    const exact = scale * line.components.reduce((sum, component) => sum + tableModel(reading, component, temperature), 0)
    const noise = sigma ?? relative * Math.abs(exact)
    return { ...line, intensity: exact + (normal ? noise * normal() : 0), sigma: noise, used: true }
  })
  return { reading, lines: measured, noise: 'absolute', strengthSet: null }
}
