import type { AxisMedium, AxisUnit, ValueKind } from '../types/spectrum'

const axisUnitWords: Record<AxisUnit, string[]> = {
  'nm': ['nm', 'nanometer', 'nanometers', 'nanometre', 'nanometres'],
  'angstrom': ['a', 'aa', 'å', 'ang', 'angstrom', 'angstroms', 'ångström', 'ångstrom'],
  'um': ['um', 'µm', 'micron', 'microns', 'micrometer', 'micrometers', 'micrometre', 'micrometres'],
  'cm-1': ['cm-1', 'cm^-1', 'cm**-1', 'cm^{-1}', 'cm⁻¹', '1/cm', '/cm', 'kayser', 'kaysers'],
  'GHz': ['ghz'],
  'MHz': ['mhz'],
  'Hz': ['hz'],
  'pixel': ['pixel', 'pixels', 'pix', 'px', 'channel', 'channels'],
}
const unitByWord = new Map(Object.entries(axisUnitWords).flatMap(([unit, words]) => words.map(word => [word, unit as AxisUnit])))

/** The unit a word names, or null. Both Angstrom signs, both micro signs and the minus sign are known. */
export function axisUnitOf(word: string): AxisUnit | null {
  const plain = word.trim().normalize('NFKC').toLowerCase().replaceAll('μ', 'µ').replaceAll('−', '-').replaceAll('⁻¹', '-1')
  return unitByWord.get(plain) ?? null
}

export function mediumOf(text: string): AxisMedium | null {
  const vacuum = /(^|[^a-z])vac(uum)?([^a-z]|$)/i.test(text)
  const air = /(^|[^a-z])air([^a-z]|$)/i.test(text)
  return vacuum === air ? null : vacuum ? 'vacuum' : 'air'
}

/** Only units that say it outright; counts, ADU and electrons do not, and are asked. */
export function valueKindOf(unit: string): ValueKind | null {
  const photons = /(^|[^a-z])(photons?|ph|rayleighs?)([^a-z]|$)/i.test(unit) || /(^|[^A-Za-z])k?R([^A-Za-z]|$)/.test(unit)
  const energy = /(^|[^a-z])(ergs?|watts?|joules?|jy|mjy)([^a-z]|$)/i.test(unit) || /(^|[^A-Za-z])[mun]?[WJ]([^A-Za-z]|$)/.test(unit)
  return photons === energy ? null : photons ? 'photons' : 'energy'
}

/** Wavenumbers and frequencies belong to the vacuum (a wave keeps its frequency in air), so their medium is never asked. */
export const impliesVacuum = (unit: AxisUnit | null) => unit === 'cm-1' || unit === 'GHz' || unit === 'MHz' || unit === 'Hz'
