import type { ResultLine } from '#shared/engine/types'
import { encodePng, type Rgb } from './png'

const width = 520
const height = 168
const margin = 12
// Palette indices; 0 is the paper.
const rule = 1
const ink = 2
const muted = 3
const accent = 4
const palette: Rgb[] = [[250, 247, 240], [200, 194, 182], [54, 64, 84], [160, 158, 152], [190, 84, 40]]

/** The lines hang from one rule, each as long as it is strong; a short cross-stroke marks the fitted envelope. */
export function envelopePicture(lines: ResultLine[]): Buffer | null {
  const shown = lines.filter(line => Number.isFinite(line.intensity)).sort((a, b) => a.termEnergy - b.termEnergy).slice(0, 60)
  const top = Math.max(0, ...shown.flatMap(line => [line.intensity, line.model ?? 0]))
  if (shown.length === 0 || top <= 0) return null
  const pixels = new Uint8Array(width * height)
  const fill = (x: number, y: number, w: number, h: number, colour: number) => {
    for (let row = Math.max(0, Math.round(y)); row < Math.min(height, Math.round(y + h)); row++) pixels.fill(colour, row * width + Math.round(x), row * width + Math.round(x + w))
  }
  const step = (width - 2 * margin) / shown.length
  const stroke = Math.max(2, Math.min(10, step / 3))
  const reach = height - 2 * margin - 8
  fill(margin, margin, width - 2 * margin, 4, ink)
  shown.forEach((line, index) => {
    const centre = margin + (index + 0.5) * step
    fill(centre - stroke / 2, margin + 4, stroke, Math.max(1, line.intensity / top * reach), line.used ? ink : muted)
    if (line.model !== null) fill(centre - stroke, margin + 2 + line.model / top * reach, 2 * stroke, 4, accent)
  })
  fill(margin, height - margin + 2, width - 2 * margin, 1, rule)
  return encodePng({ width, height, pixels, palette })
}

export const pictureSize = { width: width / 2, height: height / 2 }
