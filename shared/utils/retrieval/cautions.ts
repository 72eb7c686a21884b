import type { LineList } from '../../types/line-list'
import type { ChosenLine } from './list-lines'

const general = 'A rotational temperature stands for the temperature of the gas only where collisions keep the levels in balance.'

/** What must be read beside the number: what it rests on, whose strengths, and what two lines cannot say. */
export function cautionsFor(list: LineList | null, chosen: readonly ChosenLine[], set: string | null, usedCount: number, bandCount: number): string[] {
  const bands = [...new Set(chosen.map(({ band }) => band))]
  const cautions = bands.length > 0 ? bands.map(band => `${band.title}: ${band.caution}`) : [general]
  const strengthSet = list?.strengthSets.find(({ name }) => name === set)
  if (strengthSet) cautions.push(`Line strengths: ${strengthSet.title}. Another set gives another temperature, and that difference does not average down.`)
  else cautions.push('Line strengths are those given with the lines; another source would give another temperature, and that difference does not average down.')
  if (strengthSet && !strengthSet.absolute && new Set(bands.map(band => band.id.split('-')[0])).size > 1) {
    cautions.push(`The set ${strengthSet.name} holds relative strengths: scales of bands with different upper levels cannot be compared.`)
  }
  if (usedCount - bandCount === 1) cautions.push('So few lines give a value but no test of it.')
  return cautions
}
