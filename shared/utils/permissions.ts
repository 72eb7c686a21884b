import { serviceActions, type CampaignAction, type CampaignRole, type ServiceAction, type Who } from '../types/roles'

const reader = ['see', 'export'] as const
const observer = [...reader, 'comment', 'upload', 'submit', 'abort-own', 'revise-own'] as const
const analyst = [...observer, 'abort-any', 'revise-any', 'review', 'edit-equipment', 'edit-recipes'] as const
const lead = [...analyst, 'edit-campaign', 'manage-members', 'release', 'archive'] as const

/** The one table of who may do what inside a campaign; routes and pages both ask it. */
export const allowedActions: Record<CampaignRole, readonly CampaignAction[]> = { reader, observer, analyst, lead }

export const may = (role: CampaignRole | null | undefined, action: CampaignAction): boolean =>
  role != null && allowedActions[role].includes(action)

export const isServiceAction = (action: string): action is ServiceAction => (serviceActions as readonly string[]).includes(action)

/** Someone as far as the service is concerned; without `via`, somebody on a page. Null is a visitor. */
export type Caller = { isAdministrator: boolean, via?: 'session' | 'token' } | null | undefined

/** A token can do neither what makes more tokens nor what administers the service: it is copied too easily. */
const onPage = (caller: Caller): boolean => caller != null && caller.via !== 'token'

/** The table's other side: what is asked of the caller where no campaign is concerned. */
export const mayOnService = (caller: Caller, who: 'anyone' | 'account' | 'page' | ServiceAction): boolean => {
  if (who === 'anyone') return true
  if (who === 'account') return caller != null
  return onPage(caller) && (who === 'page' || caller!.isAdministrator)
}

/** Rights that a route can check before it reads anything, as they depend on no campaign. */
export type DoorRight = 'page' | ServiceAction
export const isDoorRight = (who: Who): who is DoorRight => who === 'page' || isServiceAction(who)
