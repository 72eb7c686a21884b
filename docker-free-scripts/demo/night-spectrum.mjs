import { ohMeinel } from './line-list.mjs'
import { airOf, photonStrength } from './physics.mjs'
import { normal } from './random.mjs'

/** First pixel in vacuum nm: the window holds P1(2) to P1(5). */
const windowStart = { '3-1': 1514, '4-2': 1593, '5-2': 1080 }
const pixelCount = 1024
const strengthSet = 'brooke2016'

/** Every component of every band inside the window: place (nm) and photons, the band's own P1(2) being `bandStrength`. */
function emission({ start, end, temperature, bandStrength }) {
  return ohMeinel.bands.flatMap((band) => {
    const scale = bandStrength / bandReference(band, temperature)
    return band.lines.flatMap(line => line.components
      .map(component => ({ at: 1e7 / component.wavenumber, photons: scale * photonStrength(component, strengthSet, temperature) }))
      .filter(({ at }) => at > start - 2 && at < end + 2))
  })
}

function bandReference(band, temperature) {
  const line = band.lines.find(candidate => candidate.label === 'P1(2)')
  return line.components.reduce((sum, component) => sum + photonStrength(component, strengthSet, temperature), 0) || Infinity
}

function profile(x, lines, fwhm) {
  const width = fwhm / (2 * Math.sqrt(2 * Math.log(2)))
  let sum = 0
  for (const { at, photons } of lines) {
    const t = (x - at) / width
    if (Math.abs(t) < 7) sum += photons * Math.exp(-0.5 * t * t)
  }
  return sum / (width * Math.sqrt(2 * Math.PI))
}

/**
 * An invented night-sky spectrum as a text table: wavelength, photons, sigma. Noise is Gaussian and seeded.
 * `ceiling` clips the values as a full detector does.
 * @param {{ band: string, temperature: number, seed: number, medium: string, head?: string[], bandStrength?: number, noise?: number, fwhm?: number, ceiling?: number, start?: number, pixelWidth?: number }} night
 */
export function nightSpectrum({ band, temperature, seed, medium, head = [], bandStrength = 400, noise = 6, fwhm = 0.22, ceiling = Infinity, start = windowStart[band], pixelWidth = 0.05 }) {
  const lines = emission({ start, end: start + pixelCount * pixelWidth, temperature, bandStrength })
  const draw = normal(seed)
  const rows = Array.from({ length: pixelCount }, (_, index) => {
    const vacuum = start + index * pixelWidth
    const light = 40 + 0.15 * (vacuum - start) + profile(vacuum, lines, fwhm)
    const sigma = noise * Math.sqrt(1 + light / 400)
    const value = Math.min(ceiling, light + sigma * draw())
    const axis = medium === 'air' ? airOf(vacuum) : vacuum
    return `${axis.toFixed(5)},${value.toFixed(3)},${sigma.toFixed(3)}`
  })
  return [...head.map(line => `# ${line}`), 'wavelength,photons,sigma', ...rows, ''].join('\n')
}
