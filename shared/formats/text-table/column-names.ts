import type { AxisMedium, AxisUnit } from '../../types/spectrum'
import { axisUnitOf, mediumOf } from '../units'

/** What a column's heading says: "wavelength (nm, air)" is name "wavelength", unit text "nm, air". */
export interface ColumnHeading { raw: string, name: string, unitText: string | null, axisUnit: AxisUnit | null, medium: AxisMedium | null, conflict: boolean }

const axisWord = /^((vacuum|vac|air)[ _-]*)?(wavelengths?|wavelen|wave|lambda|λ|lam|wl|wvl|wavenumbers?|wn|freq|frequency|frequencies|pixels?|pix|channels?|spectral[ _]axis|axis|x)([ _-]*(vacuum|vac|air))?$/
const sigmaWord = /(^|[ _-])(sigma|σ|errors?|err|uncertainty|uncert|unc|std|stdev|stddev|noise)([ _-]|$)|(error|err|sigma|unc)$|^(e|d)[ _]?(flux|intensity|counts?|signal|values?)$/
const valuesWord = /^(intensity|intensities|fluxes|flux|flux[ _]density|counts?|count[ _]rate|signal|values?|radiance|irradiance|brightness|spectrum|data|photons?|photon[ _](flux|rate)|electrons?|adu|dn|amplitude|power|y|i)$/

export function parseHeading(raw: string): ColumnHeading {
  const text = raw.trim().replace(/^"(.*)"$/, '$1').trim()
  const bracketed = /^(.*?)\s*[([{]\s*(.*?)\s*[)\]}]\s*$/.exec(text)
  const before = (bracketed?.[1] ?? text).trim()
  const [name, suffixUnit] = splitSuffix(before)
  const bracketUnit = bracketed ? firstAxisUnit(bracketed[2]!) : null
  const conflict = bracketUnit !== null && suffixUnit !== null && bracketUnit !== suffixUnit
  const own = /^(pixels?|pix|channels?)$/i.test(name) ? 'pixel' : null
  return {
    raw: text,
    name: name.toLowerCase(),
    unitText: bracketed?.[2] || null,
    axisUnit: conflict ? null : bracketUnit ?? suffixUnit ?? own,
    medium: mediumOf(text.replaceAll('_', ' ')),
    conflict,
  }
}

/** "wavelength_nm", "Wavelength/nm": a unit at the end counts only behind a mark and when it is longer than one letter. */
function splitSuffix(name: string): [string, AxisUnit | null] {
  const parts = /^(.*?)\s*[_/]\s*([^_/\s]{2,})$/.exec(name)
  const unit = parts ? axisUnitOf(parts[2]!) : null
  return unit ? [parts![1]!, unit] : [name, null]
}

function firstAxisUnit(text: string): AxisUnit | null {
  for (const word of [text, ...text.split(/[,;\s]+/)]) {
    const unit = axisUnitOf(word)
    if (unit) return unit
  }
  return null
}

export interface ColumnGuess { axis: number | null, values: number | null, sigma: number | null }

/** Roles by name only; a role that two columns claim is left open. */
export function guessColumns(headings: ColumnHeading[]): ColumnGuess {
  const only = (test: (name: string) => boolean) => {
    const found = headings.flatMap((heading, index) => test(heading.name) ? [index] : [])
    return found.length === 1 ? found[0]! : null
  }
  const isAxis = (name: string) => axisWord.test(name)
  const isSigma = (name: string) => !/^(wave|lambda|freq)/.test(name) && sigmaWord.test(name)
  return { axis: only(isAxis), sigma: only(isSigma), values: only(name => !isAxis(name) && !isSigma(name) && valuesWord.test(name)) }
}
