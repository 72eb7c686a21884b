export const campaignKinds = ['airglow', 'atmosphere', 'interstellar', 'comet', 'laboratory', 'other'] as const
export type CampaignKind = (typeof campaignKinds)[number]

/** Who may read a campaign besides its members: nobody, or every signed-in account. */
export const visibilities = ['members', 'service'] as const
export type Visibility = (typeof visibilities)[number]
