import { referenceLines } from './reference-file'

export interface CatalogueLine { frequencyMHz: number, lgIntensity: number, energyLower: number, gUpper: number }

/** Lines of the 80-column catalogue layout (F13.4, F8.4, F8.4, I2, F10.4, I3, ...). */
export function readCatalogue(path: string): CatalogueLine[] {
  return referenceLines(path).filter(row => /^ *\d+\.\d{4}/.test(row)).map(row => ({
    frequencyMHz: Number(row.slice(0, 13)),
    lgIntensity: Number(row.slice(21, 29)),
    energyLower: Number(row.slice(31, 41)),
    gUpper: Number(row.slice(41, 44)),
  }))
}

/** Temperatures of the catalogue's partition functions, K. */
export const partitionTemperatures = [300, 225, 150, 75, 37.5, 18.75, 9.375]

/** lg Q at `partitionTemperatures` of a species by its tag. */
export function readLgPartition(path: string, tag: number): number[] {
  const row = referenceLines(path).find(line => Number(line.slice(0, 6)) === tag)
  if (!row) throw new Error(`no partition function for tag ${tag}`)
  return partitionTemperatures.map((_, i) => Number(row.slice(26 + 7 * i, 33 + 7 * i)))
}
