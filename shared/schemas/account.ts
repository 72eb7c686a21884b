import * as z from 'zod'
import { lineSchema } from './text'
import { mailPreferences, tokenScopes } from '../types/roles'

export const emailSchema = z.string().trim().toLowerCase().max(254, 'An e-mail address takes at most 254 characters.')
  .pipe(z.email('Enter an e-mail address such as name@example.org.'))

export const passwordSchema = z.string()
  .min(12, 'A password takes at least 12 characters; a few words in a row make a good one.')
  .max(200, 'A password takes at most 200 characters.')

export const nameSchema = lineSchema('A name', 120, 'Enter a name.')

export const setUpSchema = z.strictObject({
  token: z.string().min(20, 'The set-up link is not complete.').max(200),
  email: emailSchema,
  name: nameSchema,
  password: passwordSchema,
})
export type SetUp = z.output<typeof setUpSchema>

/** What may be typed into the sign-in form: no rule that would tell what a password looks like. */
export const credentialsSchema = z.object({ email: z.string().max(254), password: z.string().max(200) })

export const profileChangeSchema = z.strictObject({
  name: nameSchema.optional(),
  mailPreference: z.enum(mailPreferences).optional(),
  version: z.int().positive('State the version you have read.'),
})
export type ProfileChange = z.output<typeof profileChangeSchema>

export const passwordChangeSchema = z.strictObject({
  current: z.string().min(1, 'Enter the present password.').max(200),
  next: passwordSchema,
}).refine(({ current, next }) => current !== next, { path: ['next'], message: 'The new password is the old one.' })
export type PasswordChange = z.output<typeof passwordChangeSchema>

export const newTokenSchema = z.strictObject({
  name: nameSchema,
  scope: z.enum(tokenScopes).default('read'),
  /** null: until it is removed. */
  expiresInDays: z.int().min(1).max(3650).nullable().default(365),
})
export type NewToken = z.output<typeof newTokenSchema>
