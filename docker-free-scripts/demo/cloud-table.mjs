import { coRotation } from './line-list.mjs'
import { brightness } from './physics.mjs'
import { normal } from './random.mjs'

const background = 2.725

/**
 * An invented CO line table (K km/s) of one pointing at one temperature; noise is Gaussian and seeded.
 * @param {{ name: string, temperature: number, seed: number, observedAt: string, labels?: string[], noise?: number }} pointing
 */
export function cloudTable({ name, temperature, seed, observedAt, labels = ['1-0', '2-1', '3-2', '4-3'], noise = 0.015 }) {
  const draw = normal(seed)
  const [band] = coRotation.bands
  const model = labels.map(label => brightness(band.lines.find(line => line.label === label).components[0], 'cdms', temperature, background))
  const scale = 24 / model[0]
  const sigma = 24 * noise
  return {
    name,
    observable: 'brightness-integral',
    lineList: 'co-rotation',
    band: 'v=0',
    strengthSet: 'cdms',
    Tbg: background,
    observedAt,
    lines: labels.map((label, index) => ({ label, intensity: Number((scale * model[index] + sigma * draw()).toFixed(4)), sigma: Number(sigma.toFixed(4)) })),
  }
}
