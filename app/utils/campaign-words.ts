import type { CampaignKind } from '#shared/schemas/campaign'

export const campaignKindWords: Record<CampaignKind, string> = {
  airglow: 'airglow',
  atmosphere: 'atmosphere',
  interstellar: 'interstellar gas',
  comet: 'comet',
  laboratory: 'laboratory',
  other: 'other',
}
