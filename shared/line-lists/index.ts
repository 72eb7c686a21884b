import type { LineList, LineListSummary } from '../types/line-list'
import summaries from './summaries.json'

/** What is built in, without loading the lists themselves. */
export const lineListSummaries: LineListSummary[] = summaries

const loaders: Record<string, () => Promise<{ default: unknown }>> = {
  'oh-meinel': () => import('./oh-meinel.json'),
  'co-rotation': () => import('./co-rotation.json'),
}

const loaded = new Map<string, Promise<LineList>>()

/** A built-in line list by id, or null; loaded once per process. The lists are ours, so their shape is known (a test checks it). */
export async function loadLineList(id: string): Promise<LineList | null> {
  if (!Object.hasOwn(loaders, id)) return null
  const known = loaded.get(id) ?? loaders[id]().then(module => module.default as LineList)
  loaded.set(id, known)
  return known
}
