import type { Description } from '#shared/formats/describe-spectrum'
import { nothingSaid } from '#shared/formats/merge-about'
import type { SpectrumAbout } from '#shared/types/spectrum'
import type { SpectrumRow } from '../../database/spectra/repository'
import { wavelengthRange } from './wavelength-range'

/** The columns of a row that follow from reading its bytes. */
export type Reading = Pick<SpectrumRow, 'format' | 'pixelCount' | 'wavelengthFrom' | 'wavelengthTo' | 'about' | 'missing' | 'warnings' | 'problem' | 'observedAt'>

const timeOf = ({ observedAt }: SpectrumAbout) => observedAt ? new Date(observedAt) : null

/** What was said of a file that cannot be read is kept for when it can. */
export function readingOf(description: Description, said: Partial<SpectrumAbout>): Reading {
  if (description.ok) {
    const { format, pixelCount, ends, about, missing, warnings } = description.facts
    return { format, pixelCount, ...wavelengthRange(ends, about), about, missing, warnings, problem: null, observedAt: timeOf(about) }
  }
  const about = { ...nothingSaid, ...said }
  return { format: 'unknown', pixelCount: 0, wavelengthFrom: null, wavelengthTo: null, about, missing: [], warnings: [], problem: description.error, observedAt: timeOf(about) }
}
