import { parseRecipeAddress, recipeAddressSchema, type RecipeDetail, type RecipePatch } from '#shared/schemas/recipe'
import type { CampaignAction } from '#shared/types/roles'
import { DomainError } from '#shared/utils/domain-error'
import { lockCampaigns } from '../../database/campaigns/repository-members'
import { findRecipeVersions, setRecipeArchived, type RecipeRow } from '../../database/campaigns/repository-recipes'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { changesBetween } from '../campaigns/changes'
import { refuseUnusable, storeVersion } from './store-version'
import { addressOf, recipeView } from './view'

export interface RecipeAt { slug: string, recipe: string }
type Versions = Awaited<ReturnType<typeof findRecipeVersions>>
interface Found { versions: Versions, asked: Versions[number], newest: RecipeRow }

const notFound = (recipe: string) => new DomainError('not_found', `The campaign has no recipe ${recipe}.`)

/** All versions of the recipe and the one that was asked for, for whoever may do this in its campaign. */
async function recipeFor(actor: Actor, { slug, recipe }: RecipeAt, action: CampaignAction): Promise<Found> {
  const { campaign } = await campaignFor(actor, slug, action)
  if (!recipeAddressSchema.safeParse(recipe).success) throw notFound(recipe)
  const { slug: recipeSlug, version } = parseRecipeAddress(recipe)
  const versions = await findRecipeVersions(database(), campaign.id, recipeSlug)
  const asked = version === null ? versions.at(-1) : versions.find(row => row.recipe.version === version)
  if (!asked) throw notFound(recipe)
  return { versions, asked, newest: versions.at(-1)!.recipe }
}

const detailOf = ({ versions, asked, newest }: Found): RecipeDetail => ({
  ...recipeView(asked.recipe, asked.createdBy, asked.recipe.version === newest.version),
  versions: versions.map(({ recipe, createdBy, retrievals }) =>
    ({ version: recipe.version, address: addressOf(recipe), name: recipe.name, createdBy, createdAt: recipe.createdAt.toISOString(), retrievals })),
})

export const readRecipe = async (actor: Actor, at: RecipeAt): Promise<RecipeDetail> => detailOf(await recipeFor(actor, at, 'see'))

/** A change makes the next version; results keep the one they were made under. Where nothing differs, none is made. */
export async function changeRecipe(actor: Actor, at: RecipeAt, { version, name, settings }: RecipePatch): Promise<RecipeDetail> {
  const found = await recipeFor(actor, at, 'edit-recipes')
  const { newest } = found
  const newestAt = { slug: at.slug, recipe: newest.slug }
  if (newest.version !== version) throw stale(await readRecipe(actor, newestAt))
  const wanted = { name: name ?? newest.name, settings: settings ?? newest.settings }
  if (Object.keys(changesBetween<RecipeRow>(newest, wanted)).length === 0) return readRecipe(actor, newestAt)
  await refuseUnusable(wanted.settings)
  const body = { campaignId: newest.campaignId, slug: newest.slug, ...wanted }
  if (!await storeVersion(actor, body, now => now?.version !== version)) throw stale(await readRecipe(actor, newestAt))
  return readRecipe(actor, newestAt)
}

const stale = (current: RecipeDetail) =>
  new DomainError('stale_version', `Somebody made version ${current.version} of this recipe in the meantime. Look at it and change it again.`, undefined, current)

/** Archives all versions of a recipe or brings them back; retrievals under them stay as they are. */
export async function archiveRecipe(actor: Actor, at: RecipeAt, archived: boolean): Promise<RecipeDetail> {
  const { newest } = await recipeFor(actor, at, 'edit-recipes')
  await database().transaction(async (tx) => {
    await lockCampaigns(tx, [newest.campaignId])
    const now = (await findRecipeVersions(tx, newest.campaignId, newest.slug)).at(-1)!.recipe
    if ((now.archivedAt !== null) === archived) return
    await setRecipeArchived(tx, now, archived ? new Date() : null)
    await writeLogbook(tx, { campaignId: now.campaignId, objectKind: 'recipe', objectId: now.id, actorId: actor.userId, action: archived ? 'archive' : 'unarchive', detail: {} })
  })
  return readRecipe(actor, { slug: at.slug, recipe: newest.slug })
}
