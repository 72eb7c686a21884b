import { nightTemperature, nightTime } from './calendar.mjs'
import { nightSpectrum } from './night-spectrum.mjs'

export const slug = 'hollow-ridge-winter-nights'
const nights = 60

const stations = [
  { slug: 'hollow-ridge', name: 'Hollow Ridge', latitude: 61.42, longitude: 9.87, altitude: 1130, prefix: 'HR', band: '3-1', medium: 'vacuum' },
  { slug: 'lantern-point', name: 'Lantern Point', latitude: 58.03, longitude: 6.51, altitude: 45, prefix: 'LP', band: '4-2', medium: 'air' },
]
const lines = ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)']
const settingsFor = (band, more = {}) => ({ observable: 'photon-emission', lineList: 'oh-meinel', bands: [band], lines, strengthSet: 'brooke2016', ...more })

const recipes = [
  { slug: 'oh-3-1', name: 'OH(3-1) P1(2)-P1(5)', settings: settingsFor('3-1') },
  { slug: 'oh-4-2', name: 'OH(4-2) P1(2)-P1(5)', settings: settingsFor('4-2') },
  { slug: 'oh-3-1-two-lines', name: 'OH(3-1) two lines, quick look', settings: settingsFor('3-1', { lines: ['P1(2)', 'P1(4)'] }) },
]

export async function addAirglowCampaign(lead) {
  await lead.create('/api/campaigns', {
    slug, title: 'Hollow Ridge winter nights', kind: 'airglow',
    description: 'Invented demonstration data: hydroxyl nightglow from two invented stations over sixty nights.',
  })
  for (const { slug: station, name, latitude, longitude, altitude, medium } of stations) {
    await lead.create(`/api/campaigns/${slug}/stations`, { slug: station, name, latitude, longitude, altitude })
    await lead.create(`/api/campaigns/${slug}/instruments`, {
      slug: `${station}-grating`, name: `Grating spectrometer, ${name}`, station, axisUnit: 'nm', medium, valueKind: 'photons', defaultObservable: 'photon-emission', fwhm: 0.22, notes: 'Invented.',
    })
  }
  const known = await lead.get(`/api/campaigns/${slug}/recipes`)
  for (const recipe of recipes.filter(one => !known.items.some(item => item.slug === one.slug))) await lead.create(`/api/campaigns/${slug}/recipes`, recipe)
}

const dateOf = index => nightTime(index).toISOString().slice(0, 10)

function nightOf(index, { prefix, slug: station, band, medium }, number) {
  return {
    name: `${prefix}-${dateOf(index)}.csv`,
    text: nightSpectrum({ band, medium, temperature: nightTemperature(index, number), seed: 1000 * (number + 1) + index, head: ['Invented demonstration data.'] }),
    about: { axisUnit: 'nm', medium, valueKind: 'photons', valueUnit: 'rayleigh/nm', columns: { axis: 0, values: 1, sigma: 2 }, observedAt: nightTime(index).toISOString(), station, instrument: `${station}-grating` },
  }
}

/** Spectra in which something is wrong, as it happens. */
function troubled() {
  const [ridge] = stations
  const spoil = (index, name, change, about = {}) => {
    const night = nightOf(index, ridge, 0)
    return { ...night, name, text: nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: nightTemperature(index, 0), seed: 9000 + index, head: [`Invented demonstration data: ${name}.`], ...change }), about: { ...night.about, ...about } }
  }
  return [
    { key: 'clouded', recipe: 'oh-3-1', night: spoil(3, 'HR-clouded.csv', { bandStrength: 12, noise: 14 }) },
    { key: 'saturated', recipe: 'oh-3-1', night: spoil(9, 'HR-saturated.csv', { ceiling: 700 }, { fullScale: 700 }) },
    { key: 'wrong-range', recipe: 'oh-4-2', night: spoil(15, 'HR-wrong-range.csv', {}) },
    { key: 'no-signal', recipe: 'oh-3-1', night: spoil(21, 'HR-shutter-closed.csv', { bandStrength: 0, noise: 6 }) },
    { key: 'two-lines', recipe: 'oh-3-1-two-lines', night: spoil(27, 'HR-two-lines.csv', {}) },
    // Neither the sender nor the file says air or vacuum, so it waits for its owner.
    { key: 'unsaid-medium', recipe: 'oh-3-1', night: spoil(33, 'HR-medium-not-stated.csv', {}, { medium: null, instrument: null }) },
  ]
}

export async function submitNights(observer) {
  for (const [number, station] of stations.entries()) {
    const indices = Array.from({ length: nights }, (_, index) => index).filter(index => index % stations.length === number)
    const spectrumIds = []
    for (const index of indices) spectrumIds.push(await observer.upload(slug, nightOf(index, station, number)))
    await observer.submit(slug, `demo-nights-${station.slug}`, { spectrumIds, recipe: `oh-${station.band}`, note: `All nights of ${station.name}.` })
  }
  for (const { key, recipe, night } of troubled()) {
    const id = await observer.upload(slug, night)
    await observer.submit(slug, `demo-${key}`, { spectrumIds: [id], recipe })
  }
}
