import { createHash, randomBytes } from 'node:crypto'
import mysql, { type Connection, type RowDataPacket } from 'mysql2/promise'
import { ulid } from 'ulid'

export type Role = 'lead' | 'analyst' | 'observer' | 'reader'

/** An API call with a bearer token; answers status and parsed body, whatever they are. */
export type Call = <T = unknown>(method: string, path: string, body?: unknown, headers?: Record<string, string>) => Promise<{ status: number, body: T }>

export const connect = (databaseUrl: string): Promise<Connection> => mysql.createConnection({ uri: databaseUrl, timezone: 'Z' })

export const caller = (origin: string, token: string): Call => async <T>(method: string, path: string, body?: unknown, headers: Record<string, string> = {}) => {
  const response = await fetch(`${origin}${path}`, {
    method,
    headers: { authorization: `Bearer ${token}`, ...(body === undefined ? {} : { 'content-type': 'application/json' }), ...headers },
    body: body === undefined ? undefined : JSON.stringify(body),
  })
  const text = await response.text()
  return { status: response.status, body: (response.headers.get('content-type')?.includes('json') ? JSON.parse(text) : text) as T }
}

/** A token of an account that exists. */
export async function tokenFor(connection: Connection, email: string, scope: 'read' | 'submit' = 'submit'): Promise<string> {
  const token = `trl_${randomBytes(24).toString('base64url')}`
  await connection.query('INSERT INTO api_tokens (id, user_id, name, token_hash, scope, created_at) SELECT ?, id, ?, ?, ?, ? FROM users WHERE email = ?',
    [ulid(), 'test', createHash('sha256').update(token).digest('hex'), scope, new Date(), email])
  return token
}

export interface Account { email: string, userId: string, token: string, call: Call }

/** A new account with a token, and a place in a campaign if one is named. */
export async function addAccount(connection: Connection, origin: string, { name, preference = 'none', campaignId, role }: { name: string, preference?: 'each' | 'digest' | 'none', campaignId?: string, role?: Role }): Promise<Account> {
  const userId = ulid()
  const email = `${name}-${userId.toLowerCase()}@trotline.example`
  await connection.query('INSERT INTO users (id, email, name, mail_preference, created_at) VALUES (?, ?, ?, ?, ?)', [userId, email, name, preference, new Date()])
  if (campaignId) await connection.query('INSERT INTO memberships (campaign_id, user_id, role, created_at) VALUES (?, ?, ?, ?)', [campaignId, userId, role, new Date()])
  const token = await tokenFor(connection, email)
  return { email, userId, token, call: caller(origin, token) }
}

/** An empty campaign. */
export async function addCampaign(connection: Connection, slug: string): Promise<string> {
  const id = ulid()
  await connection.query('INSERT INTO campaigns (id, slug, title, kind, description, created_at) VALUES (?, ?, ?, ?, ?, ?)', [id, slug, `Test campaign ${slug}`, 'airglow', '', new Date()])
  return id
}

export async function rowsOf<T extends object>(connection: Connection, sql: string, values: unknown[] = []): Promise<T[]> {
  const [rows] = await connection.query<RowDataPacket[]>(sql, values)
  return rows as T[]
}
