import { monotonicFactory } from 'ulid'

const next = monotonicFactory()

/** A new ULID. Within one process ids grow, even within one millisecond, so id order is creation order. */
export const newId = (): string => next()
