import { readSpectrum } from '#shared/formats/read-spectrum'
import type { ReadSpectrum, SpectrumAbout } from '#shared/types/spectrum'
import { firstRows } from '~/utils/submit/first-rows'
import type { ReadSummary } from '~/utils/submit/entries'

/** A spectrum and what is known of it, or an error that says what, where and how to mend it. */
export async function readFile(file: File, about: Partial<SpectrumAbout>): Promise<{ spectrum: ReadSpectrum, about: SpectrumAbout }> {
  const outcome = readSpectrum(new Uint8Array(await file.arrayBuffer()), file.name, about)
  if (outcome.ok) return outcome
  const { message, where } = outcome.error
  throw new Error(where && !message.toLowerCase().includes(where.toLowerCase()) ? `${message} (${where})` : message)
}

function extent(values: Float64Array): [number, number] {
  let low = Infinity
  let high = -Infinity
  for (const value of values) {
    if (value < low) low = value
    if (value > high) high = value
  }
  return Number.isFinite(low) ? [low, high] : [0, 0]
}

export async function summarise(file: File, said: Partial<SpectrumAbout>): Promise<ReadSummary> {
  const { spectrum: { format, axis, values, sigma, stated, columnNames, warnings } } = await readFile(file, said)
  const [valueFrom, valueTo] = extent(values)
  return {
    format,
    pixelCount: axis.length,
    axisFrom: axis[0] ?? 0,
    axisTo: axis.at(-1) ?? 0,
    valueFrom,
    valueTo,
    hasSigma: sigma !== null,
    columnNames,
    firstRows: format === 'text' ? firstRows(await file.slice(0, 16_384).text()) : [],
    stated: said.columns && stated.columns ? { ...stated, columns: null } : stated,
    warnings,
  }
}
