import { hash, verify, type Options } from '@node-rs/argon2'

// The memory-hard profile OWASP recommends for argon2id: 19 MiB, two passes, one lane.
const cost: Options = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 }

export const hashPassword = (password: string): Promise<string> => hash(password, cost)

// Made when the server starts, so that the first sign-in does not take longer either.
const dummy = hashPassword(crypto.randomUUID())

/**
 * Whether the password fits the hash. Without a hash (no such account) the same work is done against a hash that
 * nothing fits, so that the time of the answer does not tell which e-mail addresses have an account.
 */
export async function verifyPassword(passwordHash: string | null | undefined, password: string): Promise<boolean> {
  const fits = await verify(passwordHash ?? await dummy, password)
  return fits && passwordHash != null
}
