import type { RetrievalSettings } from '#shared/schemas/settings'
import { DomainError } from '#shared/utils/domain-error'
import { recipeProblems } from '#shared/utils/recipe-problems'
import { settingsChanges } from '#shared/utils/settings-changes'
import { findRecipe, insertRecipe, type RecipeRow } from '../../database/campaigns/repository-recipes'
import { lockCampaigns } from '../../database/campaigns/repository-members'
import { database } from '../../database/client'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { getLineList } from '../line-lists/index'
import { addressOf } from './view'

export type RecipeBody = Pick<RecipeRow, 'campaignId' | 'slug' | 'name' | 'settings'>

export async function refuseUnusable(settings: RetrievalSettings): Promise<void> {
  const problems = recipeProblems(settings, settings.lineList === null ? null : await getLineList(settings.lineList))
  if (problems.length > 0) throw new DomainError('validation_failed', problems[0]!.message, problems)
}

/**
 * Stores the next version of a recipe, or the first. The campaign's row is locked, so that two people who make the next
 * version at once get one each, and none is added while the recipe is archived. @returns null when `refuse` said no
 */
export const storeVersion = (actor: Actor, body: RecipeBody, refuse: (newest: RecipeRow | undefined) => boolean = () => false): Promise<RecipeRow | null> =>
  database().transaction(async (tx) => {
    await lockCampaigns(tx, [body.campaignId])
    const newest = await findRecipe(tx, body.campaignId, { slug: body.slug, version: null })
    if (refuse(newest)) return null
    if (newest?.archivedAt) throw new DomainError('archived', `The recipe "${newest.name}" is archived. Bring it back before you make its next version, or choose another address.`, [{ path: 'slug', message: 'The recipe at this address is archived.' }])
    const row: RecipeRow = { ...body, id: newId(), version: (newest?.version ?? 0) + 1, createdBy: actor.userId, createdAt: new Date(), archivedAt: null }
    await insertRecipe(tx, row)
    const deed = newest ? { action: 'change', detail: versionChanges(newest, row) } : { action: 'create', detail: { address: addressOf(row), name: row.name, settings: row.settings } }
    await writeLogbook(tx, { campaignId: row.campaignId, objectKind: 'recipe', objectId: row.id, actorId: actor.userId, ...deed })
    return row
  })

/** What the logbook says of a new version: what differs from the one before, field by field. */
function versionChanges(before: RecipeRow, after: RecipeRow) {
  const settings = Object.entries(settingsChanges(before.settings, after.settings)).map(([key, change]) => [`settings.${key}`, change])
  const name = before.name === after.name ? {} : { name: { from: before.name, to: after.name } }
  return { version: { from: before.version, to: after.version }, ...name, ...Object.fromEntries(settings) }
}
