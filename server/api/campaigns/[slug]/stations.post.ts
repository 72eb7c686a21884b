import { campaignParams } from '#shared/schemas/campaign'
import { stationCreateSchema } from '#shared/schemas/station'
import { createStation } from '../../../services/stations/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: campaignParams, body: stationCreateSchema, status: 201 },
  ({ actor, params, body }) => createStation(actor, params.slug, body),
)
