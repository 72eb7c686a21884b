/** A line list owns g, E, A and Q together, so that they can never come from different sources. */
export interface LineListStrengthSet {
  name: string
  title: string
  citation: string
  /** False: only ratios within one band (or one upper vibrational level) mean anything. */
  absolute: boolean
  /** Known to be incomplete: shown beside the others, and no part of their spread. */
  comparisonOnly?: boolean
  note?: string
}

export interface LineListComponent {
  /** e/f parity of the lower level, or a hyperfine label; empty for a single line. */
  component: string
  /** Vacuum wavenumber, cm^-1. */
  wavenumber: number
  termUpper: number
  termLower: number
  gUpper: number
  gLower: number
  /** Einstein A (s^-1, or relative) by strength-set name; absent where the set lacks the component. */
  strengths: Record<string, number>
}

export interface LineListLine {
  label: string
  branch: string
  components: LineListComponent[]
}

export interface LineListBand {
  id: string
  title: string
  /** What the temperature of this band rests on, in words (shown beside the result). */
  caution: string
  /** Labels of the default line choice (low J). */
  recommendedLines: string[]
  lines: LineListLine[]
}

export interface LineListLevel { energy: number, degeneracy: number }

export interface LineList {
  id: string
  version: string
  title: string
  species: string
  /** What the zero of energy is. */
  energyZero: string
  provenance: string[]
  licence: string
  recommendedObservable: string
  /** In order of preference; a set that is incomplete for the chosen lines is passed over. */
  strengthSets: LineListStrengthSet[]
  bands: LineListBand[]
  /** For Q(T) by direct sum, where the list has levels. */
  levels?: LineListLevel[]
}

/** What the index of line lists says of each without loading it. */
export type LineListSummary = Pick<LineList, 'id' | 'version' | 'title' | 'species' | 'licence' | 'recommendedObservable' | 'strengthSets'> & { bands: { id: string, title: string, recommendedLines: string[], lineCount: number }[] }
