// Makes an API token for an account and prints it on the last line:
//   npm run -s token -- <email> [read|submit]
import { ulid } from 'ulid'
import { hashSecret, newApiToken } from '../server/services/accounts/secret-token.mjs'
import { runScript, withDatabase } from './lib/database.mjs'

const days = 365

await runScript(async () => {
  const [email, scope = 'submit'] = process.argv.slice(2)
  if (!email || !['read', 'submit'].includes(scope)) throw new Error('Usage: npm run -s token -- <email> [read|submit]')
  const token = newApiToken()
  await withDatabase(async (connection) => {
    const [[user]] = await connection.query('SELECT id FROM users WHERE email = ? AND deactivated_at IS NULL', [email.trim().toLowerCase()])
    if (!user) throw new Error(`There is no account ${email}.`)
    const now = new Date()
    await connection.query('INSERT INTO api_tokens (id, user_id, name, token_hash, scope, created_at, expires_at) VALUES (?, ?, ?, ?, ?, ?, ?)',
      [ulid(), user.id, 'made on the command line', hashSecret(token), scope, now, new Date(now.getTime() + days * 86_400_000)])
  })
  console.log(`Token for ${email}, scope ${scope}, good for ${days} days; it is not shown again:`)
  console.log(token)
})
