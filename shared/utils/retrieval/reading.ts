import type { ObservableReading } from '../../engine/types'
import type { RetrievalSettings } from '../../schemas/settings'
import type { LineTable } from '../../schemas/line-table'

type ReadingSource = Pick<RetrievalSettings, 'observable' | 'Tbg' | 'populationPer'> & { widthIn?: RetrievalSettings['widthIn'], signalIn?: RetrievalSettings['signalIn'] }

/** How the engine reads the observable, from settings. */
export function readingOf({ observable, Tbg, populationPer, widthIn, signalIn }: ReadingSource): ObservableReading {
  switch (observable) {
    case 'brightness-integral': return { observable, backgroundTemperature: Tbg }
    case 'level-population': return { observable, populationPer }
    case 'equivalent-width': return { observable, ...(widthIn ? { widthIn } : {}) }
    case 'raman-scatter': return { observable, ...(signalIn ? { signalIn } : {}) }
    default: return { observable }
  }
}

/** The table states its own observable; what it leaves out comes from the settings. */
export function tableReading(table: LineTable, settings: RetrievalSettings): ObservableReading {
  return readingOf({
    observable: table.observable,
    Tbg: table.Tbg ?? settings.Tbg,
    populationPer: table.populationPer ?? settings.populationPer,
    widthIn: table.widthIn ?? settings.widthIn,
    signalIn: table.signalIn ?? settings.signalIn,
  })
}

/** What a reading still lacks, as path and message. */
export function readingProblems(reading: ObservableReading, base = ''): { path: string, message: string }[] {
  if (reading.observable === 'equivalent-width' && !reading.widthIn) return [{ path: `${base}widthIn`, message: 'State what the equivalent width is measured in: wavelength, wavenumber or velocity.' }]
  if (reading.observable === 'raman-scatter' && !reading.signalIn) return [{ path: `${base}signalIn`, message: 'State whether the Raman signal counts photons or energy.' }]
  return []
}
