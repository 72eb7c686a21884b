import { logger } from './logger'

/** Order of ending: first what keeps clients waiting, last what everything else needs. */
const stages = ['streams', 'workers', 'queue', 'mail', 'database'] as const
export type StopStage = (typeof stages)[number]
interface Stop { name: string, stop: () => unknown }

const stops = new Map<StopStage, Stop[]>()
let starting: Promise<void> | undefined

/** Registers what ends with the process. Whoever opens something says here how it closes. */
export function onStop(stage: StopStage, name: string, stop: () => unknown): void {
  stops.set(stage, [...(stops.get(stage) ?? []), { name, stop }])
}

/** Ends one stage; each registered stop runs once. A failing one is logged and holds nothing up. */
export async function runStopStage(stage: StopStage): Promise<void> {
  const due = stops.get(stage) ?? []
  stops.delete(stage)
  await Promise.all(due.map(async ({ name, stop }) => {
    try {
      await stop()
    }
    catch (error) {
      logger.error({ err: error, part: name }, 'could not stop cleanly')
    }
  }))
}

export async function stopEverything(): Promise<void> {
  for (const stage of stages) await runStopStage(stage)
}

/** Begins the start-up work, once; the start-up plugin calls it. */
export const beginStart = (work: () => Promise<void>): Promise<void> => (starting ??= work())

/** Resolves when the database is there and its schema current. */
export const started = (): Promise<void> => starting ?? Promise.reject(new Error('Start-up has not begun.'))
