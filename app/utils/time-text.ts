const dateOf = (iso: string): string => iso.slice(0, 10)

/** `2026-01-14 21:40 UTC` */
export const timeText = (iso: string | null): string => iso ? `${dateOf(iso)} ${iso.slice(11, 16)} UTC` : 'time not stated'

export const dayText = (iso: string | null): string => iso ? dateOf(iso) : '–'

/** The evening's date of the night an instant belongs to: a night runs noon to noon in the station's solar time. */
export function nightOf(iso: string, longitudeEast: number | null): string {
  const solar = Date.parse(iso) + (longitudeEast ?? 0) / 15 * 3_600_000
  return new Date(solar - 12 * 3_600_000).toISOString().slice(0, 10)
}
