import { readSpectrum, type ReadOutcome } from '#shared/formats/read-spectrum'
import type { MissingField, SpectrumAbout } from '#shared/types/spectrum'
import type { InstrumentRow } from '../../database/campaigns/repository-equipment'

const suppliedBy = (instrument: InstrumentRow, missing: MissingField[]): Partial<SpectrumAbout> =>
  Object.fromEntries((['axisUnit', 'medium', 'valueKind'] as const).flatMap(field =>
    missing.includes(field) && instrument[field] !== null ? [[field, instrument[field]]] : []))

/** Reads bytes: what the person says wins, then the file, then what the team stated of the instrument. */
export function readUpload(bytes: Uint8Array, name: string, said: Partial<SpectrumAbout>, instrument: InstrumentRow | null): ReadOutcome {
  const outcome = readSpectrum(bytes, name, said)
  if (!outcome.ok || !instrument || outcome.missing.length === 0) return outcome
  const supplied = suppliedBy(instrument, outcome.missing)
  return Object.keys(supplied).length === 0 ? outcome : readSpectrum(bytes, name, { ...said, ...supplied })
}
