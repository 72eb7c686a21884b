import { defineRoute } from '../utils/route'

/** The process is alive; says nothing of what it depends on. */
export default defineRoute({ access: 'public' }, () => ({ status: 'alive' }))
