import type { SpectrumView } from '../schemas/spectrum-view'
import type { Phase } from './phases'
import type { RetrievalRow } from './retrieval'

/** `GET /api/desk`: a person's own start page. Lists hold at most ten rows, newest first. */
export interface Desk {
  /** My retrievals that wait or run. */
  running: { items: RetrievalRow[], total: number }
  /** My drafts and those that wait for me to complete them. */
  waitingForMe: { items: RetrievalRow[], total: number }
  /** My files that cannot be read, kept to be mended. */
  needsMending: { items: SpectrumView[], total: number }
  /** My retrievals that ended during the last seven days; where none did, those of others in the campaigns that I review. */
  cameBack: { items: RetrievalRow[], total: number }
  cameBackTo: 'me' | 'campaigns'
  /** Others' completed retrievals without a verdict, where I may review. */
  waitingForMyReview: { items: RetrievalRow[], total: number }
  /** Observed during the last 24 hours, by station. */
  lastNight: { station: string, campaign: string, total: number, byPhase: Partial<Record<Phase, number>> }[]
}
