import { beat } from '../../database/retrievals/claim'
import { database } from '../../database/client'

const running = new Map<string, { id: string, attempt: number }>()
const key = (held: { id: string, attempt: number }) => `${held.id}/${held.attempt}`

/** Executions of this process, which the heartbeat speaks for. */
export const noteRunning = (held: { id: string, attempt: number }): void => void running.set(key(held), held)
export const noteEnded = (held: { id: string, attempt: number }): void => void running.delete(key(held))

export const beatRunning = (): Promise<void> => beat(database(), [...running.values()])
