import type { CampaignForm, CampaignView } from '#shared/schemas/campaign'
import { campaignKindWords, visibilityWords } from '~/utils/campaign-words'
import { choice, text, type FieldWords } from '~/utils/objects/field-words'

export const campaignFields: FieldWords[] = [
  text('title', 'Title'),
  text('slug', 'Address'),
  choice('kind', 'Kind', campaignKindWords),
  text('startsOn', 'First day', 'open'),
  text('endsOn', 'Last day', 'open'),
  text('description', 'Description', 'none'),
  choice('visibility', 'Read by', visibilityWords),
  choice('selfReview', 'Review of one’s own', { true: 'allowed', false: 'not allowed' }),
]

export const emptyCampaign = (): CampaignForm =>
  ({ slug: '', title: '', kind: 'airglow', startsOn: null, endsOn: null, description: '', visibility: 'members', selfReview: false })

export const campaignForm = ({ slug, title, kind, startsOn, endsOn, description, visibility, selfReview }: CampaignView): CampaignForm =>
  ({ slug, title, kind, startsOn, endsOn, description, visibility, selfReview })
