import { createHash } from 'node:crypto'
import { DomainError } from '#shared/utils/domain-error'
import { countDown, countUp, forgetCount } from '../../jobs/counter'

const windowSeconds = 15 * 60
// A person mistypes a few times; a house behind one address has many people; an account is tried from many addresses.
const limits = { pair: 10, account: 60, address: 200 }

export interface Attempt { email: string, address: string }

/** Thrown with the seconds to wait, for Retry-After. */
export class TooManyAttempts extends DomainError {
  constructor(public readonly retryAfter: number) {
    super('rate_limited', `Too many attempts. Wait ${Math.ceil(retryAfter / 60)} minutes and try again.`)
  }
}

/** Counts the attempt before the password is looked at, so that many at once cannot slip through. */
export async function admitAttempt(attempt: Attempt): Promise<void> {
  const names = counterNames(attempt)
  const counts = await Promise.all(Object.entries(names).map(async ([kind, name]) => ({ ...await countUp(name, windowSeconds), limit: limits[kind as keyof typeof limits] })))
  const over = counts.filter(({ count, limit }) => count > limit)
  if (over.length) throw new TooManyAttempts(Math.max(...over.map(({ secondsLeft }) => secondsLeft)))
}

/** A right password clears what was counted against the account, and its own count against the address. */
export async function forgiveAttempts(attempt: Attempt): Promise<void> {
  const { pair, account, address } = counterNames(attempt)
  await Promise.all([forgetCount(pair), forgetCount(account), countDown(address)])
}

function counterNames({ email, address }: Attempt): Record<keyof typeof limits, string> {
  const account = digest(email.trim().toLowerCase())
  return { pair: `sign-in:pair:${account}:${digest(address)}`, account: `sign-in:account:${account}`, address: `sign-in:address:${digest(address)}` }
}

// Redis holds no e-mail or network addresses.
const digest = (text: string) => createHash('sha256').update(text).digest('hex').slice(0, 32)
