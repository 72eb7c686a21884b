import { normal } from './random.mjs'

const day = 86_400_000
const firstNight = Date.parse('2025-11-01T22:30:00Z')

/** Nights from 2025-11-01 on. */
export const nightTime = index => new Date(firstNight + index * day)

/** An invented winter: a slow rise to midwinter, a planetary wave of nine nights, and weather. */
export function nightTemperature(index, station) {
  const weather = normal(7919 * (station + 1) + index)()
  return 199 + 7 * Math.sin(2 * Math.PI * (index - 15) / 180) + 3.5 * Math.sin(2 * Math.PI * index / 9.3) - 2 * station + 2 * weather
}
