import type { RetrievalResult, UncertaintyComponent } from '#shared/engine/types'

export interface BudgetRow { name: string, kelvin: number, share: number, systematic: boolean, commonTo: string }

const commonWords: Record<UncertaintyComponent['commonTo'], string> = {
  line: 'one line',
  band: 'one band',
  instrument: 'one instrument',
  campaign: 'the whole campaign',
  all: 'every result with this strength set',
}

/** Noise first, then each systematic by size; `share` is the length of its bar, the longest being 1. */
export function budgetRows(result: Pick<RetrievalResult, 'temperature' | 'components'>): BudgetRow[] {
  if (!result.temperature) return []
  const rows = [
    { name: 'noise', kelvin: result.temperature.uNoise, systematic: false, commonTo: 'this result only' },
    ...[...result.components].sort((a, b) => b.kelvin - a.kelvin)
      .map(({ name, kelvin, commonTo }) => ({ name, kelvin, systematic: true, commonTo: commonWords[commonTo] })),
  ]
  const longest = Math.max(...rows.map(row => row.kelvin))
  return rows.map(row => ({ ...row, share: longest > 0 ? row.kelvin / longest : 0 }))
}

/** Which components an average over many results does not make smaller, in one sentence; null when there is none. */
export function sharedSentence(components: UncertaintyComponent[]): string | null {
  const shared = components.filter(({ commonTo }) => commonTo === 'instrument' || commonTo === 'campaign' || commonTo === 'all').map(({ name }) => name)
  if (!shared.length) return null
  const names = shared.length === 1 ? shared[0] : `${shared.slice(0, -1).join(', ')} and ${shared.at(-1)}`
  return `${names} ${shared.length === 1 ? 'is' : 'are'} shared by many results: an average does not make ${shared.length === 1 ? 'it' : 'them'} smaller.`
}
