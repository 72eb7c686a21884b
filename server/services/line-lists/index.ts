import { createHash } from 'node:crypto'
import { lineListSummaries, loadLineList } from '#shared/line-lists/index'
import type { LineList, LineListSummary } from '#shared/types/line-list'
import { DomainError } from '#shared/utils/domain-error'
import type { Actor } from '../accounts/actor'

/** Built-in lists are everybody's; the actor is asked for because lists of a campaign's own come to stand here. */
export function lineListSummariesFor(_actor: Actor): LineListSummary[] {
  return lineListSummaries
}

/** A list by id, cached in the process; null when there is none. */
export const getLineList = (id: string): Promise<LineList | null> => loadLineList(id)

export async function requireLineList(id: string): Promise<LineList> {
  const list = await getLineList(id)
  if (!list) throw new DomainError('not_found', `There is no line list ${id}.`)
  return list
}

const answers = new Map<string, { json: string, etag: string }>()

/** The list as text, made once per process: it is some hundred kilobytes and never changes under one version. */
export async function lineListAnswer(id: string): Promise<{ json: string, etag: string }> {
  const list = await requireLineList(id)
  const known = answers.get(id) ?? tagged(JSON.stringify(list))
  answers.set(id, known)
  return known
}

const tagged = (json: string) => ({ json, etag: `"${createHash('sha256').update(json).digest('base64url').slice(0, 22)}"` })
