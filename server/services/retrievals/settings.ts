import type * as z from 'zod'
import type { SettingsPatch } from '#shared/schemas/retrieval-submit'
import { settingsSchema, type RetrievalSettings } from '#shared/schemas/settings'
import { DomainError } from '#shared/utils/domain-error'
import { unavailableMethod } from '#shared/utils/check-settings'

/** What is said wins over what it is laid upon; what neither says has its default. */
export function mergeSettings(base: RetrievalSettings | undefined, patch: SettingsPatch | undefined): RetrievalSettings {
  const said = Object.fromEntries(Object.entries(patch ?? {}).filter(([, value]) => value !== undefined))
  const parsed = settingsSchema.safeParse({ ...base, ...said })
  const problems = parsed.success ? unavailableMethod(parsed.data) : fieldsOf(parsed.error)
  if (parsed.success && problems.length === 0) return parsed.data
  throw new DomainError('validation_failed', parsed.success ? problems[0]!.message : 'The settings cannot be used.', problems)
}

const fieldsOf = (error: z.ZodError) => error.issues.map(issue => ({ path: ['settings', ...issue.path].join('.'), message: issue.message }))
