import { hash } from '@node-rs/argon2'
import { ulid } from 'ulid'
import { hashSecret, newApiToken } from '../../server/services/accounts/secret-token.mjs'

export const demoPassword = 'trotline-demo'

/** One account for each role; the administrator is no member of a campaign. */
export const demoAccounts = [
  { role: 'lead', email: 'lead@trotline.example', name: 'Leda Halvorsen' },
  { role: 'analyst', email: 'analyst@trotline.example', name: 'Anselm Okoro' },
  { role: 'observer', email: 'observer@trotline.example', name: 'Odalys Brandt' },
  { role: 'reader', email: 'reader@trotline.example', name: 'Renzo Kivela' },
  { role: null, email: 'admin@trotline.example', name: 'Ada Quillfeather' },
]

/** Adds the demo accounts that are not there yet. */
export async function addAccounts(connection) {
  const passwordHash = await hash(demoPassword, { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 })
  for (const { role, email, name } of demoAccounts) {
    await connection.query('INSERT IGNORE INTO users (id, email, name, password_hash, is_administrator, mail_preference, created_at) VALUES (?, ?, ?, ?, ?, ?, ?)',
      [ulid(), email, name, passwordHash, role === null, 'digest', new Date()])
  }
}

export async function addMembers(connection, campaignId) {
  for (const { role, email } of demoAccounts.filter(account => account.role !== null && account.role !== 'lead')) {
    await connection.query('INSERT IGNORE INTO memberships (campaign_id, user_id, role, created_at) SELECT ?, id, ?, ? FROM users WHERE email = ?', [campaignId, role, new Date(), email])
  }
}

/** Runs work with an API token of the account that is gone afterwards. */
export async function withToken(connection, email, work) {
  const token = newApiToken()
  const id = ulid()
  const now = new Date()
  await connection.query('INSERT INTO api_tokens (id, user_id, name, token_hash, scope, created_at, expires_at) SELECT ?, id, ?, ?, ?, ?, ? FROM users WHERE email = ?',
    [id, 'demo seed', hashSecret(token), 'submit', now, new Date(now.getTime() + 3_600_000), email])
  try {
    return await work(token)
  }
  finally {
    await connection.query('DELETE FROM api_tokens WHERE id = ?', [id])
  }
}
