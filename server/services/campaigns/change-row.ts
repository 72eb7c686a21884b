import { DomainError } from '#shared/utils/domain-error'
import { database, type Queryable } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { changesBetween, type Changes } from './changes'

interface VersionedRow { id: string, version: number, archivedAt: Date | null }

/** A kind of thing that a campaign owns and that is changed field by field under its version. */
export interface EditableKind<Row extends VersionedRow> {
  /** As the logbook and messages call it. */
  kind: string
  read: (db: Queryable, id: string) => Promise<Row | undefined>
  update: (db: Queryable, to: { id: string, version: number, change: Partial<Row> }) => Promise<boolean>
  /** As callers see the row, for the answer to a stale version. */
  view: (row: Row) => Promise<unknown> | unknown
  /** Puts ids into words for the logbook. */
  inWords?: (db: Queryable, changes: Changes) => Promise<Changes>
}

interface Target { actor: Actor, campaignId: string, id: string }

/** Changes what differs and writes it down. @returns the row as it stands afterwards */
export async function changeRow<Row extends VersionedRow>(edited: EditableKind<Row>, target: Target, version: number, wanted: Partial<Row>): Promise<Row> {
  const before = await rowOf(edited, target.id)
  if (before.version !== version) throw await stale(edited, before)
  if (before.archivedAt) throw new DomainError('archived', `This ${edited.kind} is archived. Bring it back before you change it.`)
  const changes = changesBetween<Row>(before, wanted)
  if (Object.keys(changes).length === 0) return before
  if (!await store(edited, target, { version, change: wanted, action: 'change', changes })) throw await stale(edited, await rowOf(edited, target.id))
  return rowOf(edited, target.id)
}

/** Archives the row or brings it back; one that is so already stays as it is. */
export async function setArchived<Row extends VersionedRow>(edited: EditableKind<Row>, target: Target, archived: boolean, attemptsLeft = 3): Promise<Row> {
  const before = await rowOf(edited, target.id)
  if ((before.archivedAt !== null) === archived) return before
  const change = { archivedAt: archived ? new Date() : null } as Partial<Row>
  if (await store(edited, target, { version: before.version, change, action: archived ? 'archive' : 'unarchive', changes: {} })) return rowOf(edited, target.id)
  if (attemptsLeft > 1) return setArchived(edited, target, archived, attemptsLeft - 1)
  throw await stale(edited, await rowOf(edited, target.id))
}

interface Deed<Row> { version: number, change: Partial<Row>, action: string, changes: Changes }

const store = <Row extends VersionedRow>(edited: EditableKind<Row>, { actor, campaignId, id }: Target, { version, change, action, changes }: Deed<Row>): Promise<boolean> =>
  database().transaction(async (tx) => {
    if (!await edited.update(tx, { id, version, change })) return false
    const detail = await edited.inWords?.(tx, changes) ?? changes
    await writeLogbook(tx, { campaignId, objectKind: edited.kind, objectId: id, actorId: actor.userId, action, detail })
    return true
  })

async function rowOf<Row extends VersionedRow>(edited: EditableKind<Row>, id: string): Promise<Row> {
  const row = await edited.read(database(), id)
  if (!row) throw new DomainError('not_found', `There is no such ${edited.kind}.`)
  return row
}

const stale = async <Row extends VersionedRow>({ kind, view }: EditableKind<Row>, now: Row): Promise<DomainError> =>
  new DomainError('stale_version', `Somebody changed this ${kind} in the meantime. Look at it as it stands now and change it again.`, undefined, await view(now))
