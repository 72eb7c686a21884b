import { setInterval as every } from 'node:timers/promises'
import { readAbortFlag, type ClaimedRetrieval } from '../../database/retrievals/claim'
import { database } from '../../database/client'

const lookEveryMs = 250

export class AbortWanted extends Error {}
/** Somebody else took the retrieval over, or ended it. */
export class NoLongerHeld extends Error {}

/** Looks from time to time whether a fit is still wanted. The signal ends with why it is not, or when the process stops. */
export function watchOver({ retrieval }: ClaimedRetrieval, stopping: AbortSignal): { signal: AbortSignal, end: () => void } {
  const unwanted = new AbortController()
  const ended = new AbortController()
  void look(retrieval, unwanted, ended.signal)
  return { signal: AbortSignal.any([stopping, unwanted.signal]), end: () => ended.abort() }
}

async function look(held: { id: string, attempt: number }, unwanted: AbortController, ended: AbortSignal): Promise<void> {
  try {
    for await (const _ of every(lookEveryMs, undefined, { signal: ended })) {
      // While the database is away nobody can ask for an abort.
      const flag = await readAbortFlag(database(), held).catch(() => ({ abortRequested: false }))
      if (flag?.abortRequested === false) continue
      return unwanted.abort(flag ? new AbortWanted() : new NoLongerHeld())
    }
  }
  catch { /* ended */ }
}
