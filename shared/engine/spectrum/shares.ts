import { C2 } from '../constants'
import { observableModels } from '../line-model/observable-models'
import type { LineComponent, ModelLine, ObservableReading } from '../types'

/** Components share a line as they would at this temperature, K, or at the nearest one of the search range. Lambda components hardly depend on it. */
export const shareTemperature = 200

/** Boltzmann weight of a component, with energies counted from `zero` (cm^-1) so that nothing underflows. */
export function componentWeight(component: LineComponent, reading: ObservableReading, temperature: number, zero: number): number {
  const { strength, energy } = observableModels[reading.observable].component(component, reading)
  return strength * Math.exp(-C2 * (energy - zero) / temperature)
}

/** Sum over components of strength times Boltzmann factor: how strong the line is beside others of its band. 0 when it cannot be said. */
export function lineWeight(line: ModelLine, reading: ObservableReading, temperature: number, zero: number): number {
  const sum = line.components.reduce((total, component) => total + componentWeight(component, reading, temperature, zero), 0)
  return Number.isFinite(sum) && sum > 0 ? sum : 0
}

/** Lowest energy that the observable uses among lines, cm^-1. */
export function lowestEnergy(lines: readonly ModelLine[], reading: ObservableReading): number {
  const model = observableModels[reading.observable]
  return lines.reduce((low, line) => line.components.reduce((least, c) => Math.min(least, model.component(c, reading).energy), low), Infinity)
}

/** Zero of energy of each component's band, cm^-1: the lowest energy of its lines. T does not rule between bands. */
export function bandZeros(lines: readonly ModelLine[], reading: ObservableReading): Map<LineComponent, number> {
  const bands = new Map<string, ModelLine[]>()
  for (const line of lines) bands.set(line.band, [...bands.get(line.band) ?? [], line])
  return new Map([...bands.values()].flatMap((members) => {
    const zero = lowestEnergy(members, reading)
    return members.flatMap(line => line.components.map((component): [LineComponent, number] => [component, zero]))
  }))
}

/** Part of each component in its line, summing to 1; equal parts where the strengths are not known. Mixed bands are taken as equally bright, each from its own zero. */
export function componentShares(line: ModelLine, reading: ObservableReading, temperature: number, zeros: ReadonlyMap<LineComponent, number>): number[] {
  const lowest = lowestEnergy([line], reading)
  const zeroOf = (component: LineComponent) => line.mixesBands ? zeros.get(component) ?? lowest : lowest
  const weights = line.components.map(component => componentWeight(component, reading, temperature, zeroOf(component)))
  const sum = weights.reduce((a, b) => a + b, 0)
  const usable = sum > 0 && Number.isFinite(sum)
  return weights.map(weight => usable ? weight / sum : 1 / weights.length)
}

/** Vacuum wavelength of a component, nm. */
export const componentWavelength = (component: LineComponent) => 1e7 / component.wavenumber

/** First and last vacuum wavelength of a line's components, nm. */
export function lineExtent(line: ModelLine): [number, number] {
  const all = line.components.map(componentWavelength)
  return [Math.min(...all), Math.max(...all)]
}

/** Share-free centre of a line, nm. */
export function lineCentre(line: ModelLine): number {
  return line.components.reduce((sum, component) => sum + componentWavelength(component), 0) / line.components.length
}
