import { referenceLines } from './reference-file'

export interface LamdaLevel { energy: number, degeneracy: number }
export interface LamdaLine { upper: number, lower: number, einsteinA: number, frequencyGHz: number }

/** Levels (index = J) and radiative lines of a LAMDA file of a linear molecule. */
export function readLamda(path: string): { levels: LamdaLevel[], lines: LamdaLine[] } {
  const rows = referenceLines(path)
  const block = (heading: string): number[][] => {
    const at = rows.findIndex(row => row.startsWith(heading))
    return rows.slice(at + 3, at + 3 + Number(rows[at + 1])).map(row => row.trim().split(/\s+/).map(Number))
  }
  return {
    levels: block('!NUMBER OF ENERGY LEVELS').map(([, energy, degeneracy]) => ({ energy, degeneracy })),
    lines: block('!NUMBER OF RADIATIVE TRANSITIONS').map(([, upper, lower, einsteinA, frequencyGHz]) => ({ upper: upper - 1, lower: lower - 1, einsteinA, frequencyGHz })),
  }
}
