// Prints the one-time link by which the first administrator is made; prints nothing when there is one already.
import { ulid } from 'ulid'
import { hashSecret, newSecret } from '../server/services/accounts/secret-token.mjs'
import { runScript, withDatabase } from './lib/database.mjs'
import { setting } from './lib/environment.mjs'

const hours = 24

await runScript(async () => {
  const secret = newSecret()
  const made = await withDatabase(async (connection) => {
    const [administrators] = await connection.query('SELECT id FROM users WHERE is_administrator LIMIT 1')
    if (administrators.length) return false
    const now = new Date()
    // A newer link replaces an older one that nobody used.
    await connection.query('UPDATE one_time_links SET used_at = ? WHERE purpose = ? AND used_at IS NULL', [now, 'set-up'])
    await connection.query('INSERT INTO one_time_links (id, purpose, token_hash, created_at, expires_at) VALUES (?, ?, ?, ?, ?)',
      [ulid(), 'set-up', hashSecret(secret), now, new Date(now.getTime() + hours * 3_600_000)])
    return true
  })
  if (made) console.log(`${setting('TROTLINE_ORIGIN')}/set-up/${secret}`)
})
