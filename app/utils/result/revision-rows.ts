import { printTemperature } from '#shared/engine/format-value'
import type { RetrievalDetail } from '#shared/types/retrieval'
import { phaseWords } from '~/utils/phase-words'
import { timeText } from '~/utils/time-text'

/** Revisions, newest first, with what was noted and how each was reviewed. */
export function revisionRows({ revisions, reviews }: Pick<RetrievalDetail, 'revisions' | 'reviews'>) {
  return [...revisions].sort((a, b) => b.revision - a.revision).map(({ revision, phase, temperature, uNoise, createdBy, createdAt, note }) => ({
    revision,
    phase: phaseWords[phase],
    temperature: temperature === null ? '–' : printTemperature({ value: temperature, uNoise }).text.replace(' K', ''),
    by: createdBy,
    when: timeText(createdAt),
    remarks: [
      ...(note ? [note] : []),
      ...reviews.filter(review => review.revision === revision).map(review => `${review.verdict === 'accept' ? 'Accepted' : 'Returned'} by ${review.reviewer}${review.note ? `: ${review.note}` : ''}`),
    ],
  }))
}
