import * as z from 'zod'
import { fixedSlug, lineOfText, slugParam, slugSchema } from './fields'
import { settingsSchema } from './settings'

const name = lineOfText('The name', 120)

/** A slug that exists makes the next version: a recipe is never changed. */
export const recipeCreateSchema = z.strictObject({
  slug: slugSchema.optional(),
  name,
  settings: settingsSchema.prefault({}),
})
export type RecipeCreate = z.output<typeof recipeCreateSchema>

/** A whole recipe as its form holds it. */
export const recipeFormSchema = z.strictObject({ slug: slugSchema, name, settings: settingsSchema })
export type RecipeForm = z.output<typeof recipeFormSchema>

/** `version` is the one that was changed: when it is no longer the newest, the answer is a stale version. Settings come whole. */
export const recipePatchSchema = z.strictObject({
  version: z.int().min(1, 'Send the version of the recipe that you changed.'),
  name: name.optional(),
  settings: settingsSchema.optional(),
  slug: fixedSlug('a recipe'),
})
export type RecipePatch = z.output<typeof recipePatchSchema>

const addressPattern = /^[a-z0-9]+(?:-[a-z0-9]+)*(?:@[1-9]\d{0,8})?$/
/** `slug@version`, or `slug` for the newest version. */
export const recipeAddressSchema = z.string().trim().max(80)
  .regex(addressPattern, 'Name a recipe as slug@version, for example oh-4-2@3.')

/** An address of another form names nothing, so it is answered as not found rather than as invalid. */
export const recipeParams = z.strictObject({ slug: slugParam, recipe: z.string().min(1).max(80) })

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
  /** The recipe as a whole, with all its versions. */
  archivedAt: z.iso.datetime().nullable(),
})
export type RecipeView = z.output<typeof recipeViewSchema>

/** `GET .../recipes/{recipe}`: one version, and what there is of the others. */
export const recipeDetailSchema = recipeViewSchema.extend({
  versions: z.array(z.object({
    version: z.int(),
    address: z.string(),
    name: z.string(),
    createdBy: z.string(),
    createdAt: z.iso.datetime(),
    /** Retrievals under it. */
    retrievals: z.int(),
  })),
})
export type RecipeDetail = z.output<typeof recipeDetailSchema>
