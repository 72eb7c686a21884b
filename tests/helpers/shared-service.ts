import { readFileSync } from 'node:fs'
import type { Connection } from 'mysql2/promise'
import { ulid } from 'ulid'
import { addAccount, addCampaign, connect, type Account } from './accounts'

const said = (name: string): string => {
  const value = process.env[name]
  if (!value) throw new Error(`${name} is not set: run this through the integration project, whose set-up starts the services.`)
  return value
}

export const origin = () => said('TROTLINE_TEST_ORIGIN')
export const database = (): Promise<Connection> => connect(said('TROTLINE_TEST_DATABASE_URL'))

/** Resident memory of the web process, MB. */
export function webMemory(): number {
  const status = readFileSync(`/proc/${said('TROTLINE_TEST_WEB_PID')}/status`, 'utf8')
  return Number(/VmRSS:\s+(\d+) kB/.exec(status)![1]) / 1024
}

export interface TwoCampaigns {
  slug: string
  lead: Account
  analyst: Account
  observer: Account
  reader: Account
  /** Leads another campaign, and is no member of this one. */
  stranger: Account
  otherSlug: string
}

/** A campaign with one person of each role, and another one that must not see into it. */
export async function twoCampaigns(connection: Connection, name: string): Promise<TwoCampaigns> {
  const unique = `${name}-${ulid().slice(-8).toLowerCase()}`
  const [slug, otherSlug] = [unique, `${unique}-other`]
  const campaignId = await addCampaign(connection, slug)
  const otherId = await addCampaign(connection, otherSlug)
  const member = (role: 'lead' | 'analyst' | 'observer' | 'reader') => addAccount(connection, origin(), { name: role, campaignId, role })
  return {
    slug,
    otherSlug,
    lead: await member('lead'),
    analyst: await member('analyst'),
    observer: await member('observer'),
    reader: await member('reader'),
    stranger: await addAccount(connection, origin(), { name: 'stranger', campaignId: otherId, role: 'lead' }),
  }
}
