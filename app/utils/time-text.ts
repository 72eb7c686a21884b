const dateOf = (iso: string): string => iso.slice(0, 10)

/** `2026-01-14 21:40 UTC` */
export const timeText = (iso: string | null): string => iso ? `${dateOf(iso)} ${iso.slice(11, 16)} UTC` : 'time not stated'

export const dayText = (iso: string | null): string => iso ? dateOf(iso) : '–'
