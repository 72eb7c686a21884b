import { decimalsFor } from '#shared/engine/format-value'
import type { ResultLine } from '#shared/engine/types'
import { lineKey } from '~/utils/chart-data/line-key'
import { quantityWords, signed } from './number-words'

export interface LineRow { key: string, label: string, band: string, energy: string, intensity: string, sigma: string, residual: string, without: string, reason: string | null, measured: boolean }

/** Lines as the table prints them; `uNoise` gives the decimals of the temperatures, `power` is the power of ten taken out of the intensities. */
export function lineRows(lines: ResultLine[], uNoise: number | null, power = 0): LineRow[] {
  const scale = 10 ** power
  // A line that was never measured has no uncertainty, or one of zero.
  const sigmaOf = ({ sigma }: ResultLine) => (sigma ? sigma / scale : null)
  return lines.map((line) => {
    const sigma = sigmaOf(line)
    const measured = sigma !== null || line.intensity !== 0
    return {
      key: lineKey(line),
      label: line.label,
      band: line.band,
      energy: line.termEnergy.toFixed(2),
      intensity: measured ? quantityWords(line.intensity / scale, sigma) : '–',
      sigma: sigma === null ? '–' : quantityWords(sigma, sigma),
      residual: line.residual === null ? '–' : signed(line.residual, 1),
      without: line.temperatureWithout === null ? '–' : line.temperatureWithout.toFixed(decimalsFor(uNoise)),
      reason: line.reason ?? null,
      measured,
    }
  })
}
