import { stationNightsQuerySchema, stationParams } from '#shared/schemas/station'
import { listNights } from '../../../../../services/stations/nights'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute(
  { access: 'read', params: stationParams, query: stationNightsQuerySchema },
  ({ actor, params, query }) => listNights(actor, params, query),
)
