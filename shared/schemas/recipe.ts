import * as z from 'zod'
import { slugSchema } from './campaign'
import { settingsSchema } from './settings'

/** A slug that exists makes the next version: a recipe is never changed. */
export const recipeCreateSchema = z.strictObject({
  slug: slugSchema.optional(),
  name: z.string().trim().min(1, 'A recipe needs a name.').max(120),
  settings: settingsSchema.prefault({}),
})
export type RecipeCreate = z.output<typeof recipeCreateSchema>

/** `slug@version`, or `slug` for the newest version. */
export const recipeAddressSchema = z.string().trim().max(80)
  .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*(?:@[1-9]\d{0,8})?$/, 'Name a recipe as slug@version, for example oh-4-2@3.')

export interface RecipeAddress { slug: string, version: number | null }

export function parseRecipeAddress(text: string): RecipeAddress {
  const [slug, version] = text.split('@')
  return { slug: slug ?? '', version: version === undefined ? null : Number(version) }
}

export const recipeViewSchema = z.object({
  id: z.string(),
  address: z.string(),
  slug: z.string(),
  version: z.int(),
  name: z.string(),
  settings: settingsSchema,
  createdBy: z.string(),
  createdAt: z.iso.datetime(),
  /** Is there no newer version? */
  newest: z.boolean(),
})
export type RecipeView = z.output<typeof recipeViewSchema>
