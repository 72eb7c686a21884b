import { deskOf } from '../services/desk/index'
import { defineRoute } from '../utils/route'

export default defineRoute({ access: 'read' }, ({ actor }) => deskOf(actor))
