import { instrumentParams } from '#shared/schemas/instrument'
import { readInstrument } from '../../../../../services/instruments/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'read', params: instrumentParams }, ({ actor, params }) => readInstrument(actor, params))
