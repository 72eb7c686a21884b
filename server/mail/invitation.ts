import type { CampaignRole } from '#shared/types/roles'
import { roleDeeds } from '#shared/utils/role-words'
import { noticeMail } from './notice'
import type { MailContent } from './transport'

export interface InvitationMailFacts {
  invitedBy: string
  campaign: string | null
  role: CampaignRole | null
  asAdministrator: boolean
  expiresAt: Date
  link: string
}

const why = 'You get this mail because somebody entered your address. If you do not know them, do nothing: without the link nobody joins in your name.'

/** The mail with the link. It says the same whether the address has an account or not. */
export function invitationMail(facts: InvitationMailFacts): MailContent {
  const { invitedBy, campaign, expiresAt, link } = facts
  return noticeMail({
    subject: campaign ? `${invitedBy} invites you to ${campaign}` : `${invitedBy} invites you to Trotline`,
    sentences: [
      ...aboutWords(facts),
      `The link works once, until ${expiresAt.toISOString().slice(0, 16).replace('T', ' ')} UTC.`,
      'It asks for your name and a password, or to sign in if you have an account already.',
    ],
    action: { link, words: 'Accept the invitation' },
    why,
  })
}

function aboutWords({ campaign, role, asAdministrator }: InvitationMailFacts): string[] {
  if (campaign && role) return [`You are invited to the campaign ${campaign} as ${role}: ${roleDeeds[role]}.`, 'Trotline turns observed spectra into rotational temperatures.']
  return [
    'You are invited to Trotline, which turns observed spectra into rotational temperatures.',
    ...(asAdministrator ? ['You would be an administrator: you look after accounts, line lists, the queue and storage.'] : []),
  ]
}
