import { accountRoutes, serviceRoutes } from './accounts'
import { adminRoutes } from './admin'
import { campaignObjectRoutes } from './campaign-objects'
import { campaignRoutes } from './campaigns'
import { lineListRoutes, logbookRoutes } from './line-lists'
import { invitationRoutes, memberRoutes } from './members'
import { retrievalRoutes } from './retrievals'
import { spectrumRoutes } from './spectra'
import type { ApiRoute } from './types'

/** Every route of the API; a test compares this with the files of server/api. */
export const apiRoutes: ApiRoute[] = [
  ...campaignRoutes, ...campaignObjectRoutes, ...memberRoutes, ...invitationRoutes, ...spectrumRoutes, ...retrievalRoutes, ...lineListRoutes, ...logbookRoutes, ...accountRoutes, ...adminRoutes, ...serviceRoutes,
]
