import { stationParams } from '#shared/schemas/station'
import { readStation } from '../../../../../services/stations/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'read', params: stationParams }, ({ actor, params }) => readStation(actor, params))
