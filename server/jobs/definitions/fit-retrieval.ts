import * as z from 'zod'
import { config } from '../../config'

/** Only names: everything else is read from the database when the job runs. */
export const fitRetrievalPayload = z.object({ id: z.string(), revision: z.int(), dispatch: z.int() })
export type FitRetrieval = z.output<typeof fitRetrievalPayload>

export const fitJobName = 'fit-retrieval'
export const fitQueueName = (): string => `trotline-fits-${config().instance}`
export const fitJobId = ({ id, revision, dispatch }: FitRetrieval): string => `r${id}-${revision}-${dispatch}`
