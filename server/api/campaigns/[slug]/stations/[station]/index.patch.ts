import { stationParams, stationPatchSchema } from '#shared/schemas/station'
import { changeStation } from '../../../../../services/stations/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute(
  { access: 'submit', params: stationParams, body: stationPatchSchema },
  ({ actor, params, body }) => changeStation(actor, params, body),
)
