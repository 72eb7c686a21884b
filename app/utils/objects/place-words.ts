interface Place { latitude: number | null, longitude: number | null, altitude: number | null }

const side = (degrees: number, plus: string, minus: string) => `${Math.abs(degrees).toFixed(3)}° ${degrees < 0 ? minus : plus}`
/** East beyond 180 degrees is west. */
const signedLongitude = (east: number) => east > 180 ? east - 360 : east
const known = (value: number | null): value is number => value !== null && Number.isFinite(value)

export const latitudeWords = (latitude: number | null): string => known(latitude) ? side(latitude, 'N', 'S') : '–'
export const longitudeWords = (longitude: number | null): string => known(longitude) ? side(signedLongitude(longitude), 'E', 'W') : '–'
export const altitudeWords = (altitude: number | null): string => known(altitude) ? `${altitude.toLocaleString('en-GB')} m`.replace('-', '−') : '–'

/** "61.420° N, 9.870° E, 1,130 m", or nothing where the place is not known. */
export function placeWords({ latitude, longitude, altitude }: Place): string {
  if (!known(latitude) || !known(longitude)) return ''
  return [latitudeWords(latitude), longitudeWords(longitude), known(altitude) ? altitudeWords(altitude) : ''].filter(Boolean).join(', ')
}
