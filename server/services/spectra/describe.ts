import type { Description, Said } from '#shared/formats/describe-spectrum'
import type { SpectrumProblem } from '#shared/types/spectrum'
import { config } from '../../config'
import type { InstrumentRow } from '../../database/campaigns/repository-equipment'
import { offLoop } from '../../threads/off-loop'
import { ThreadTimeLimit } from '../../threads/pool'

const refused = (error: SpectrumProblem): Description => ({ ok: false, error })

/** What the team stated of an instrument fills what neither person nor file says. */
export const fallbackOf = (instrument: InstrumentRow | null): Said['fallback'] =>
  instrument ? { axisUnit: instrument.axisUnit, medium: instrument.medium, valueKind: instrument.valueKind } : {}

/** Reads the bytes of a file, a large one beside the event loop. Never throws for what the bytes are. */
export async function describeBytes(bytes: Uint8Array, name: string, said: Said): Promise<Description> {
  try {
    return withinLimit(await offLoop('describe', { bytes, name, said }))
  }
  catch (error) {
    if (!(error instanceof ThreadTimeLimit)) throw error
    return refused({ code: 'too_slow', message: 'Reading the file took longer than a minute, which no spectrum does. Export it anew as plain text (CSV) or as a 1-D FITS image.' })
  }
}

/** The service may take less than the formats allow. */
function withinLimit(description: Description): Description {
  const most = config().limits.pixels
  if (!description.ok || description.facts.pixelCount <= most) return description
  return refused({ code: 'too_many_pixels', message: `A spectrum takes at most ${most} pixels here; this one has ${description.facts.pixelCount}. Cut it to the range of the lines, or bin it.` })
}

