import { invitationTokenSchema } from '#shared/schemas/invitation'
import { readOffer } from '../../services/invitations/answer'
import { defineRoute } from '../../utils/route'

/** A POST, so that the link's secret stands in no log of addresses. */
export default defineRoute({ access: 'public', body: invitationTokenSchema }, ({ body }) => readOffer(body.token))
