import type { CampaignRole } from '#shared/types/roles'
import { roleDeeds } from '#shared/utils/role-words'
import { noticeMail } from './notice'
import type { MailContent } from './transport'

export type MembershipChange = { what: 'role', from: CampaignRole, to: CampaignRole } | { what: 'removed' } | { what: 'appointed' }
export type MembershipMailFacts = MembershipChange & { by: string, campaign: string, link: string }

const why = 'You get this mail because it changes what you may do. It does not depend on your mail preferences.'

/** To whoever's place in a campaign somebody else changed. */
export function membershipMail(facts: MembershipMailFacts): MailContent {
  const { by, campaign, link } = facts
  const action = { link, words: 'Open the campaign' }
  if (facts.what === 'removed') {
    return noticeMail({
      subject: `You are no longer a member of ${campaign}`,
      sentences: [`${by} removed you from the campaign ${campaign}. You can no longer see it.`, 'What you submitted stays in the campaign under your name. If this is a mistake, ask them to invite you again.'],
      why,
    })
  }
  if (facts.what === 'appointed') {
    return noticeMail({ subject: `You lead ${campaign} now`, sentences: [`${by}, administrator of this service, handed the campaign ${campaign} on to you, because its only lead can no longer act.`, `As lead you also own its members, settings and releases.`], action, why })
  }
  return noticeMail({
    subject: `You are ${facts.to} of ${campaign} now`,
    sentences: [`${by} changed your role in the campaign ${campaign} from ${facts.from} to ${facts.to}.`, `As ${facts.to}: ${roleDeeds[facts.to]}.`],
    action,
    why,
  })
}
