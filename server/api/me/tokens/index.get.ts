import { tokensOf } from '../../../services/accounts/tokens'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read' }, async ({ actor }) => {
  const items = await tokensOf(actor)
  return { items, nextCursor: null, total: items.length }
})
