/**
 * Local mean solar time: UTC plus four minutes for each degree east. It differs from what a sundial shows by at most
 * 17 minutes (the equation of time), which does not matter where a night is cut at noon.
 */
const dayMs = 86_400_000
const halfDayMs = 43_200_000
const msPerDegree = 240_000

/** How far solar time is ahead of UTC, ms; a longitude of 350 degrees east is 10 degrees west. */
export const solarOffsetMs = (longitudeEast: number | null): number => {
  const east = longitudeEast ?? 0
  return Math.round((east > 180 ? east - 360 : east) * msPerDegree)
}

/** The instant read on a solar clock, as an RFC 3339 text without a zone: `2026-01-14T22:19:28.800`. */
export const solarTime = (iso: string, longitudeEast: number | null): string =>
  new Date(Date.parse(iso) + solarOffsetMs(longitudeEast)).toISOString().slice(0, 23)

/** The date of the evening of the night that holds an instant: a night runs from noon to noon in solar time. */
export const nightOf = (iso: string, longitudeEast: number | null): string =>
  new Date(Date.parse(iso) + solarOffsetMs(longitudeEast) - halfDayMs).toISOString().slice(0, 10)

/** The two solar noons, in UTC, between which a night lies. */
export function nightBounds(night: string, longitudeEast: number | null): { from: string, to: string } {
  const noon = Date.parse(`${night}T12:00:00.000Z`) - solarOffsetMs(longitudeEast)
  return { from: new Date(noon).toISOString(), to: new Date(noon + dayMs).toISOString() }
}
