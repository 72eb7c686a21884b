import type { FlagName } from '#shared/engine/types'
import type { RetrievalSort } from '#shared/schemas/retrieval-list'
import type { Phase } from '#shared/types/phases'

/** What the retrievals table shows; it lives in the address, so that a view can be sent and gone back to. */
export interface RetrievalView {
  campaign: string
  phase: Phase | ''
  flag: FlagName | ''
  band: string
  verdict: 'accept' | 'return' | 'none' | ''
  /** One submission. */
  batch: string
  /** Days, UTC, both inclusive. */
  from: string
  to: string
  q: string
  sort: RetrievalSort | `-${RetrievalSort}`
  limit: number
  cursor: string
}

export const emptyView: RetrievalView = { campaign: '', phase: '', flag: '', band: '', verdict: '', batch: '', from: '', to: '', q: '', sort: '-created', limit: 50, cursor: '' }
export const filterKeys = ['campaign', 'phase', 'flag', 'band', 'verdict', 'batch', 'from', 'to', 'q'] as const

type Query = Record<string, unknown>
const first = (value: unknown): string => String((Array.isArray(value) ? value[0] : value) ?? '')

/** Reads the address of the page; the server checks the values. */
export function fromRoute(query: Query): RetrievalView {
  const view: Query = { ...emptyView }
  for (const key of Object.keys(emptyView)) if (query[key] != null) view[key] = first(query[key])
  const limit = Number(view.limit)
  return { ...view, limit: [25, 50, 100, 250].includes(limit) ? limit : 50 } as RetrievalView
}

/** Only what differs from the empty view, for a short address. */
export function toRoute(view: RetrievalView): Record<string, string> {
  const kept = Object.entries(view).filter(([key, value]) => value !== '' && value !== emptyView[key as keyof RetrievalView])
  return Object.fromEntries(kept.map(([key, value]) => [key, String(value)]))
}

const startOfDay = (day: string): string => `${day}T00:00:00.000Z`
const nextDay = (day: string): string => new Date(Date.parse(startOfDay(day)) + 86_400_000).toISOString()

/** The query of `GET /api/retrievals`: `to` becomes the first instant after its day. */
export function toQuery(view: RetrievalView): Record<string, string> {
  const { from, to, ...rest } = view
  const kept = Object.entries(rest).filter(([, value]) => value !== '').map(([key, value]) => [key, String(value)])
  return { ...Object.fromEntries(kept), ...(from && { from: startOfDay(from) }), ...(to && { to: nextDay(to) }) }
}

/** The same filter as a file. */
export function exportAddress(view: RetrievalView): string {
  const { limit: _limit, cursor: _cursor, ...filter } = toQuery(view)
  return `/api/exports/retrievals?${new URLSearchParams({ ...filter, format: 'csv' })}`
}
