import { stationParams } from '#shared/schemas/station'
import { archiveStation } from '../../../../../services/stations/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'submit', params: stationParams }, ({ actor, params }) => archiveStation(actor, params, true))
