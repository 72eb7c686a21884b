/** Job phases of the IVOA Universal Worker Service standard. */
export const phases = ['PENDING', 'QUEUED', 'EXECUTING', 'COMPLETED', 'ERROR', 'ABORTED', 'HELD'] as const
export type Phase = (typeof phases)[number]
export const finalPhases: readonly Phase[] = ['COMPLETED', 'ERROR', 'ABORTED']
export const isFinal = (phase: Phase): boolean => finalPhases.includes(phase)
