/** What is known of a file's content; null means not stated, and is asked. */
export const axisUnits = ['nm', 'angstrom', 'um', 'cm-1', 'GHz', 'MHz', 'Hz', 'pixel'] as const
export type AxisUnit = (typeof axisUnits)[number]
export const axisMedia = ['vacuum', 'air'] as const
export type AxisMedium = (typeof axisMedia)[number]
export const airFormulas = ['ciddor1996', 'edlen1966', 'edlen1953', 'peck-reeder1972'] as const
export type AirFormula = (typeof airFormulas)[number]
/** What the values count: decides photon or energy strength. */
export const valueKinds = ['photons', 'energy'] as const
export type ValueKind = (typeof valueKinds)[number]

/** What a person or the file says about one spectrum. */
export interface SpectrumAbout {
  axisUnit: AxisUnit | null
  medium: AxisMedium | null
  airFormula: AirFormula
  valueKind: ValueKind | null
  /** Free text, e.g. "rayleigh/nm". */
  valueUnit: string | null
  /** Column numbers (0-based) of a text file; null sigma column: none. */
  columns: { axis: number, values: number, sigma: number | null } | null
  observedAt: string | null
  exposureSeconds: number | null
  station: string | null
  instrument: string | null
  /** Detector full scale in the unit of the values. */
  fullScale: number | null
}

export const spectrumFormats = ['text', 'fits', 'json'] as const
export type SpectrumFormat = (typeof spectrumFormats)[number]

/** Why the bytes of a file could not be read, what to do, and where in the file. */
export interface SpectrumProblem { code: string, message: string, where?: string }

/** A spectrum as read from bytes: numbers as in the file, order as in the file. */
export interface ReadSpectrum {
  format: SpectrumFormat
  /** What the file calls itself, where its format has a place for that. */
  name?: string
  axis: Float64Array
  values: Float64Array
  sigma: Float64Array | null
  /** What the file itself states; null where it does not. */
  stated: Partial<SpectrumAbout>
  /** Names of columns, for a text file. */
  columnNames: string[]
  warnings: string[]
}
export type MissingField = 'axisUnit' | 'medium' | 'valueKind' | 'columns'
