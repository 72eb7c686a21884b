import type { Phase } from '#shared/types/phases'

/** The phases of a job, as people say them. */
export const phaseWords: Record<Phase, string> = {
  PENDING: 'draft',
  QUEUED: 'queued',
  EXECUTING: 'running',
  COMPLETED: 'completed',
  ERROR: 'failed',
  ABORTED: 'aborted',
  HELD: 'needs an answer',
}
