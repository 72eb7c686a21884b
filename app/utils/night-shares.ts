import type { Phase } from '#shared/types/phases'

export interface NightShares { completed: number, failed: number, open: number, held: number, total: number }

/** What became of a set of retrievals, in the four kinds that matter the morning after. */
export function nightShares(byPhase: Partial<Record<Phase, number>>): NightShares {
  const count = (...wanted: Phase[]) => wanted.reduce((sum, phase) => sum + (byPhase[phase] ?? 0), 0)
  return {
    completed: count('COMPLETED'),
    failed: count('ERROR', 'ABORTED'),
    open: count('QUEUED', 'EXECUTING'),
    held: count('PENDING', 'HELD'),
    total: Object.values(byPhase).reduce((sum, n) => sum + n, 0),
  }
}
