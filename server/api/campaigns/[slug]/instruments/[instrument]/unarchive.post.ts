import { instrumentParams } from '#shared/schemas/instrument'
import { archiveInstrument } from '../../../../../services/instruments/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'submit', params: instrumentParams }, ({ actor, params }) => archiveInstrument(actor, params, false))
