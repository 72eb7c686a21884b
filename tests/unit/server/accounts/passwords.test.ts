import { describe, expect, it } from 'vitest'
import { passwordSchema, setUpSchema } from '#shared/schemas/account'
import { hashPassword, verifyPassword } from '~~/server/services/accounts/passwords'
import { apiTokenPrefix, hashSecret, newApiToken } from '~~/server/services/accounts/secret-token.mjs'

describe('a password', () => {
  it('fits its own argon2id hash and no other', async () => {
    const hash = await hashPassword('a few words in a row')
    expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
    expect(await verifyPassword(hash, 'a few words in a row')).toBe(true)
    expect(await verifyPassword(hash, 'a few words in a roW')).toBe(false)
  })

  it('never fits an account that is not there', async () => {
    expect(await verifyPassword(undefined, 'anything at all')).toBe(false)
    expect(await verifyPassword(null, '')).toBe(false)
  })

  it('takes 12 to 200 characters and says so', () => {
    expect(passwordSchema.safeParse('x'.repeat(12)).success).toBe(true)
    expect(passwordSchema.safeParse('x'.repeat(200)).success).toBe(true)
    expect(passwordSchema.safeParse('x'.repeat(11)).error?.issues[0]?.message).toMatch(/at least 12/)
    expect(passwordSchema.safeParse('x'.repeat(201)).error?.issues[0]?.message).toMatch(/at most 200/)
  })
})

it('an e-mail address is kept in small letters without spaces around it', () => {
  const parsed = setUpSchema.parse({ token: 'x'.repeat(43), email: '  Ann@Example.ORG ', name: ' Ann ', password: 'x'.repeat(12) })
  expect(parsed).toMatchObject({ email: 'ann@example.org', name: 'Ann' })
})

it('a token holds 256 random bits, and only its hash tells nothing of it', () => {
  const token = newApiToken()
  expect(Buffer.from(token.slice(apiTokenPrefix.length), 'base64url')).toHaveLength(32)
  expect(newApiToken()).not.toBe(token)
  expect(hashSecret(token)).toMatch(/^[0-9a-f]{64}$/)
  // NIST FIPS 180-2 appendix B.1: SHA-256 of "abc".
  expect(hashSecret('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad')
})
