import { referenceLines } from './reference-file'

export interface HitranLine { wavenumber: number, intensity: number, einsteinA: number, energyLower: number, gUpper: number, gLower: number }

/** 160-column HITRAN records behind a wavelength and a blank, 13 characters. */
export function readHitran(path: string): HitranLine[] {
  return referenceLines(path).map((row) => {
    const record = row.slice(13)
    return {
      wavenumber: Number(record.slice(3, 15)),
      intensity: Number(record.slice(15, 25)),
      einsteinA: Number(record.slice(25, 35)),
      energyLower: Number(record.slice(45, 55)),
      gUpper: Number(record.slice(146, 153)),
      gLower: Number(record.slice(153, 160)),
    }
  })
}
