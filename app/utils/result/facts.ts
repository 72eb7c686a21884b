import type { RetrievalSettings } from '#shared/schemas/settings'
import type { Provenance, RetrievalDetail } from '#shared/types/retrieval'
import { methodWords, noiseWords, observableWords } from '~/utils/setting-words'

export interface Fact { name: string, value: string, code?: boolean }

export function provenanceFacts(provenance: Provenance): Fact[] {
  const { lineList, lineListVersion } = provenance
  return [
    { name: 'input SHA-256', value: provenance.inputSha256, code: true },
    { name: 'line list', value: lineList ? `${lineList} ${lineListVersion ?? ''}`.trim() : 'molecular data given with the lines', code: lineList !== null },
    { name: 'strength set', value: provenance.strengthSet ?? 'as given with the lines', code: provenance.strengthSet !== null },
    { name: 'engine version', value: provenance.engineVersion, code: true },
    { name: 'settings hash', value: provenance.settingsHash, code: true },
    { name: 'seed', value: String(provenance.seed), code: true },
  ]
}

export function settingsFacts(settings: RetrievalSettings): Fact[] {
  const facts: Fact[] = [
    { name: 'observable', value: observableWords[settings.observable] },
    { name: 'line list', value: settings.lineList ?? 'none: molecular data given with the lines', code: settings.lineList !== null },
    { name: 'bands', value: settings.bands.join(', ') || 'the only band of the list', code: settings.bands.length > 0 },
    { name: 'lines', value: settings.lines.join(', ') || 'the recommended lines of the list', code: settings.lines.length > 0 },
    { name: 'strength set', value: settings.strengthSet ?? 'the recommended set that is complete for these lines', code: settings.strengthSet !== null },
    { name: 'method', value: methodWords[settings.method] },
    { name: 'noise', value: noiseWords[settings.noise] },
    { name: 'line profile', value: `${settings.profile.shape}, width ${settings.profile.fwhm === null ? 'free' : `${settings.profile.fwhm} nm`}, shift ${settings.shift}` },
    { name: 'continuum order', value: String(settings.continuumOrder), code: true },
    { name: 'masks', value: settings.masks.map(([from, to]) => `${from}–${to} nm`).join(', ') || 'none' },
    { name: 'search range', value: `${settings.temperatureRange[0]}–${settings.temperatureRange[1]} K`, code: true },
    { name: 'band scales', value: settings.bandScales === 'own' ? 'each band its own' : 'one for all bands' },
    { name: 'seed', value: String(settings.seed), code: true },
  ]
  return settings.observable === 'brightness-integral' ? [...facts, { name: 'background', value: `${settings.Tbg} K`, code: true }] : facts
}

export function inputFacts(detail: RetrievalDetail): Fact[] {
  const { spectrum, lineTable } = detail
  if (!spectrum) return [{ name: 'input', value: `line table of ${lineTable?.lines.length ?? 0} lines, given as ${lineTable ? observableWords[lineTable.observable] : 'unknown'}` }]
  const { about } = spectrum
  return [
    { name: 'file', value: `${spectrum.name} (${spectrum.format}, ${spectrum.pixelCount} pixels)` },
    { name: 'axis', value: [about.axisUnit ?? 'unit not stated', about.medium === 'air' ? `air (${about.airFormula})` : about.medium ?? 'medium not stated'].join(', ') },
    { name: 'values', value: [about.valueKind ?? 'kind not stated', about.valueUnit].filter(Boolean).join(', ') },
    ...(about.exposureSeconds === null ? [] : [{ name: 'exposure', value: `${about.exposureSeconds} s` }]),
  ]
}
