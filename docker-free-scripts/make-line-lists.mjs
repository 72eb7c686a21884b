// Writes shared/line-lists/*.json from the reference data in tests/truth and the CO constants.
// Run it again whenever a source or a citation changes: node docker-free-scripts/make-line-lists.mjs
import { writeFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { coRotation } from './line-lists/co-rotation.mjs'
import { ohMeinel } from './line-lists/oh-meinel.mjs'

const target = name => fileURLToPath(new URL(`../shared/line-lists/${name}.json`, import.meta.url))

const summaryOf = list => ({
  id: list.id,
  version: list.version,
  title: list.title,
  species: list.species,
  licence: list.licence,
  recommendedObservable: list.recommendedObservable,
  strengthSets: list.strengthSets,
  bands: list.bands.map(band => ({ id: band.id, title: band.title, recommendedLines: band.recommendedLines, lineCount: band.lines.length })),
})

const lists = [ohMeinel(), coRotation()]
for (const list of lists) writeFileSync(target(list.id), `${JSON.stringify(list)}\n`)
writeFileSync(target('summaries'), `${JSON.stringify(lists.map(summaryOf))}\n`)
for (const list of lists) console.log(list.id, list.version, `${list.bands.length} bands`, `${list.bands.reduce((n, band) => n + band.lines.length, 0)} lines`)
