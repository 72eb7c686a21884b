import type { Observable } from '#shared/engine/types'
import type { RetrievalSettings } from '#shared/schemas/settings'

export const observableWords: Record<Observable, string> = {
  'photon-emission': 'photons emitted',
  'energy-emission': 'energy emitted',
  'brightness-integral': 'integrated brightness temperature',
  'absorption-area': 'area of an absorption line',
  'optical-depth-integral': 'integrated optical depth',
  'equivalent-width': 'equivalent width',
  'level-population': 'level populations',
  'raman-scatter': 'rotational Raman scattering',
  'envelope-only': 'shape of the envelope only',
}

export const methodWords: Record<RetrievalSettings['method'], string> = {
  'envelope': 'one temperature from the line intensities',
  'spectrum': 'one temperature from the whole spectrum',
  'two-temperature': 'two temperatures',
  'optical-depth': 'one temperature with optical depth',
}

export const noiseWords: Record<RetrievalSettings['noise'], string> = {
  'absolute': 'sigmas are standard uncertainties',
  'relative': 'sigmas are right up to one common factor',
  'from-residuals': 'not known: taken from the residuals',
}

export const optionsOf = <K extends string>(words: Record<K, string>): { value: K, label: string }[] =>
  (Object.entries(words) as [K, string][]).map(([value, label]) => ({ value, label: label[0]!.toUpperCase() + label.slice(1) }))
