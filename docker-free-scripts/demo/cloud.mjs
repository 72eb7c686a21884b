import { nightTime } from './calendar.mjs'
import { cloudTable } from './cloud-table.mjs'

export const slug = 'quiet-cloud-co-survey'

/** Invented pointings: excitation temperatures of a cold core and its warmer edge, K. */
const temperatures = [8.2, 8.9, 9.4, 10.1, 10.8, 11.6, 12.7, 13.9, 15.5, 17.8, 20.6, 24.3]

export async function addCloudCampaign(lead) {
  await lead.create('/api/campaigns', {
    slug, title: 'Quiet Cloud CO survey', kind: 'interstellar',
    description: 'Invented demonstration data: integrated CO lines towards twelve pointings of an invented dark cloud.',
  })
  const known = await lead.get(`/api/campaigns/${slug}/recipes`)
  if (known.items.length === 0) {
    await lead.create(`/api/campaigns/${slug}/recipes`, {
      slug: 'co-ladder', name: 'CO rotation diagram', settings: { observable: 'brightness-integral', lineList: 'co-rotation', bands: ['v=0'], lines: ['1-0', '2-1', '3-2', '4-3'], strengthSet: 'cdms', Tbg: 2.725 },
    })
  }
}

export async function submitPointings(observer) {
  for (const [index, temperature] of temperatures.entries()) {
    const lineTable = cloudTable({ name: `Quiet Cloud, pointing ${index + 1}`, temperature, seed: 500 + index, observedAt: nightTime(index).toISOString() })
    await observer.submit(slug, `demo-pointing-${index + 1}`, { lineTable, recipe: 'co-ladder' })
  }
}
