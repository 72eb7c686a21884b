import type { Transaction } from '../../database/client'
import type { InvitationRow } from '../../database/invitations/repository'
import { writeLogbook } from '../../database/logbook/repository'

type Deed = 'invite' | 'invite-again' | 'withdraw-invitation' | 'join'

/** In the logbook of the campaign; what concerns the service is noted with the invitation itself. */
export const noteInvitation = (tx: Transaction, actorId: string, { id, campaignId, email, role, asAdministrator }: InvitationRow, action: Deed): Promise<void> =>
  writeLogbook(tx, {
    campaignId, actorId, action,
    ...(campaignId ? { objectKind: 'campaign', objectId: campaignId } : { objectKind: 'invitation', objectId: id }),
    detail: { email, ...(role ? { role } : {}), ...(asAdministrator ? { asAdministrator } : {}) },
  })
