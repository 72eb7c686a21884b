import { idParams } from '#shared/schemas/ids'
import { resendMail } from '../../../../services/admin/mails'
import { defineRoute } from '../../../../utils/route'

export default defineRoute({ access: 'submit', who: 'manage-queue', params: idParams }, ({ actor, params }) => resendMail(actor, params.id))
