import type { PictureData } from '#shared/types/retrieval'
import type { BoltzmannSeries } from './boltzmann'
import type { LineMark } from './line-marks'

const list = (words: string[]) => words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`

/** The spectrum in words, for those who do not see it. */
export function describeSpectrum(picture: PictureData, marks: LineMark[]): string {
  if (!picture.wavelength.length) return 'The spectrum holds no pixel.'
  const values = picture.values
  const highest = values.reduce((best, value, index) => (value > values[best]! ? index : best), 0)
  const extent = `Spectrum of ${picture.wavelength.length} points from ${picture.wavelength[0]!.toFixed(2)} to ${picture.wavelength.at(-1)!.toFixed(2)}; the highest value, ${values[highest]!.toPrecision(4)}, stands at ${picture.wavelength[highest]!.toFixed(2)}.`
  const used = marks.filter(mark => mark.used).map(mark => `${mark.label} at ${mark.x.toFixed(2)} nm`)
  return used.length ? `${extent} Lines of the model: ${list(used)}.` : extent
}

/** The Boltzmann plot in words: how many lines, from where to where, and what is out of the ordinary. */
export function describeBoltzmann({ bands }: BoltzmannSeries): string {
  const sentences = bands.map(({ band, points, fit }) => {
    const used = points.filter(point => point.used)
    const [start, end] = fit
    const falls = start && end ? ` The fitted line falls from ${start.y.toFixed(2)} to ${end.y.toFixed(2)}.` : ''
    const hollow = points.filter(point => point.hollow && !point.atEdge).map(point => point.label)
    const edge = points.filter(point => point.atEdge).map(point => point.label)
    return `Band ${band}: ${used.length} of ${points.length} lines used, ${list(points.map(point => `${point.label} ${point.atEdge ? 'without logarithm' : point.y.toFixed(2)}`))}.${falls}`
      + (hollow.length ? ` At or below three sigma: ${list(hollow)}.` : '')
      + (edge.length ? ` Zero or negative, on the edge: ${list(edge)}.` : '')
  })
  return `ln(I/w) against energy. ${sentences.join(' ')}`
}
