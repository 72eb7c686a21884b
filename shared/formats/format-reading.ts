import type { ReadSpectrum, SpectrumAbout } from '../types/spectrum'

/** What a reader of one format gives back. `proposedColumns`: chosen by guess, to be confirmed. */
export interface FormatReading {
  spectrum: ReadSpectrum
  proposedColumns: SpectrumAbout['columns']
}
