import type { MemberView } from '#shared/schemas/campaign'
import type { MemberRow } from '../../database/campaigns/repository-members'

export const memberView = ({ createdAt, deactivatedAt, ...member }: MemberRow): MemberView =>
  ({ ...member, since: createdAt.toISOString(), active: deactivatedAt === null })
