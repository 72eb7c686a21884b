import { flagWords } from '#shared/engine/flags'
import type { RetrievalResult } from '#shared/engine/types'
import { plural } from '~/utils/plural'

export interface Chip { words: string, warns: boolean }

const probability = (p: number) => (p < 0.001 ? 'fit p below 0.001' : `fit p = ${p.toFixed(p < 0.01 ? 3 : 2)}`)

/** What was checked, in words; every raised flag in words, never its code. */
export function resultChips(result: Pick<RetrievalResult, 'lines' | 'leverArm' | 'pValue' | 'curvatureZ' | 'flags'>): Chip[] {
  const used = result.lines.filter(line => line.used).length
  const lever = result.leverArm === null ? '' : `, lever arm ${result.leverArm.toFixed(1)}`
  const told: Chip[] = [{ words: `${plural(used, 'line')}${lever}`, warns: false }]
  if (result.pValue !== null) told.push({ words: probability(result.pValue), warns: false })
  if (result.curvatureZ !== null && !result.flags.includes('curved')) told.push({ words: `no curvature (z = ${result.curvatureZ.toFixed(1).replace('-', '−')})`, warns: false })
  return [...told, ...result.flags.map(flag => ({ words: flagWords[flag], warns: true }))]
}
