const dateOf = (iso: string): string => iso.slice(0, 10)

/** `2026-01-14 21:40 UTC` */
export const timeText = (iso: string | null): string => iso ? `${dateOf(iso)} ${iso.slice(11, 16)} UTC` : 'time not stated'

export const dayText = (iso: string | null): string => iso ? dateOf(iso) : '–'

/** "3 min ago", for lists of what came back; `now` is given so that it can be tested. */
export function agoText(iso: string, now: number): string {
  const minutes = Math.max(0, Math.round((now - Date.parse(iso)) / 60_000))
  if (minutes < 1) return 'just now'
  if (minutes < 60) return `${minutes} min ago`
  if (minutes < 48 * 60) return `${Math.round(minutes / 60)} h ago`
  return `${Math.round(minutes / 1440)} days ago`
}

/** The evening's date of the night an instant belongs to: a night runs noon to noon in the station's solar time. */
export function nightOf(iso: string, longitudeEast: number | null): string {
  const solar = Date.parse(iso) + (longitudeEast ?? 0) / 15 * 3_600_000
  return new Date(solar - 12 * 3_600_000).toISOString().slice(0, 10)
}
