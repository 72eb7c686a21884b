import { referenceLines } from './reference-file'

export interface SkyLine { vacuumAngstrom: number, flux: number }

/** Rousselot et al. 2000: vacuum wavelength and relative photon flux, rising. */
export function readRousselot(): SkyLine[] {
  return referenceLines('airglow/rousselot2000.dat').map((row) => {
    const [vacuumAngstrom, flux] = row.trim().split(/\s+/).map(Number)
    return { vacuumAngstrom, flux }
  })
}

/** The entry nearest to a vacuum wavelength (angstrom); fails when it is not that line. */
export function entryAt(list: readonly SkyLine[], vacuumAngstrom: number, within = 0.05): SkyLine {
  const off = (entry: SkyLine) => Math.abs(entry.vacuumAngstrom - vacuumAngstrom)
  const nearest = list.reduce((best, entry) => off(entry) < off(best) ? entry : best)
  if (off(nearest) > within) throw new Error(`no entry within ${within} angstrom of ${vacuumAngstrom}`)
  return nearest
}

export interface AtlasLine { airAngstrom: number, band: string, branch: string, parity: string, J: number }

/** Osterbrock et al. 1996, 1997: air wavelength and label such as "6-2 P1e(2.5)", J of the lower level. */
export function readOsterbrock(): AtlasLine[] {
  return referenceLines('airglow/osterbrock/oh.dat').flatMap((row) => {
    const parts = /^\s*([\d.]+)\s+(\d+-\d+)\s+([PQR][12])([ef])\(([\d.]+)\)/.exec(row)
    return parts ? [{ airAngstrom: Number(parts[1]), band: parts[2], branch: parts[3], parity: parts[4], J: Number(parts[5]) }] : []
  })
}
