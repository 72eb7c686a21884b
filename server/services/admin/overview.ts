import { engineVersion } from '#shared/engine/version'
import type { Overview } from '#shared/schemas/admin'
import { countAccounts } from '../../database/accounts/admin-repository'
import { database, databasePool } from '../../database/client'
import { countMailsByState } from '../../database/outbox/admin-repository'
import { countByPhase, countTroubled } from '../../database/retrievals/troubled'
import { readDatabaseVersions } from '../../database/versions'
import { redisVersion } from '../../jobs/counter'
import { queueNumbers } from '../../jobs/queue'
import { version } from '../../version'
import { overlongSeconds } from './queue'
import { readStorageUse } from './storage'

/** How the service stands, on one page. */
export async function readOverview(): Promise<Overview> {
  const db = database()
  const accounts = (state: 'all' | 'active' | 'administrator') => countAccounts(db, { q: '', state })
  const [stored, redis, total, active, administrators, mails, byPhase, troubled, queue, use] = await Promise.all([
    readDatabaseVersions(databasePool()), redisVersion(), accounts('all'), accounts('active'), accounts('administrator'),
    countMailsByState(db), countByPhase(db), countTroubled(db, overlongSeconds()), queueNumbers().catch(() => null), readStorageUse(),
  ])
  return {
    versions: { app: version, engine: engineVersion, schema: stored.schema, node: process.versions.node, database: stored.server, redis },
    accounts: { total, active, administrators },
    mails,
    byPhase,
    troubled,
    workers: queue?.workers ?? null,
    storage: { files: use.files, bytes: use.bytes, free: use.space?.free ?? null, total: use.space?.total ?? null },
  }
}
