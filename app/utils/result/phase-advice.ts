import type { Phase } from '#shared/types/phases'

/** What a phase means and what to do now, for the page of one retrieval. */
export const phaseAdvice: Record<Phase, { title: string, next: string }> = {
  PENDING: { title: 'Drafted, not submitted', next: 'Submit it when it is ready.' },
  QUEUED: { title: 'Waiting for its turn', next: 'You may leave this page; the result comes by mail too.' },
  EXECUTING: { title: 'Being fitted', next: 'This page moves to the result by itself.' },
  COMPLETED: { title: 'Completed', next: '' },
  ERROR: { title: 'No temperature could be given', next: 'Mend what the reason names and revise, or submit the spectrum again.' },
  ABORTED: { title: 'Stopped before its end', next: 'Revise it to run it again.' },
  HELD: { title: 'Held: it waits for a person', next: 'Answer what the file does not say, then submit.' },
}
