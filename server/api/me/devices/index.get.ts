import { devicesOf } from '../../../services/accounts/devices'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', who: 'page' }, async ({ actor }) => {
  const items = await devicesOf(actor)
  return { items, nextCursor: null, total: items.length }
})
