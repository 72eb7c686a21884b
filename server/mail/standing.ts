import { noticeMail } from './notice'
import type { MailContent } from './transport'

export const standings = ['deactivated', 'reactivated', 'made-administrator', 'no-administrator'] as const
export type Standing = (typeof standings)[number]

const why = 'You get this mail because it changes what you may do. It does not depend on your mail preferences.'

const words: Record<Standing, { subject: string, sentences: (by: string) => string[], action?: string }> = {
  'deactivated': {
    subject: 'Your account is deactivated',
    sentences: by => [`${by} deactivated your account on this service. You are signed out everywhere, and your API tokens are not accepted.`, 'What you submitted stays. If this is a mistake, ask them to reactivate it.'],
  },
  'reactivated': { subject: 'Your account is active again', sentences: by => [`${by} reactivated your account. Your password and your API tokens work as before.`], action: 'Sign in' },
  'made-administrator': { subject: 'You are an administrator now', sentences: by => [`${by} made you an administrator of this service: you look after accounts, line lists, the queue and storage.`], action: 'Open the administration' },
  'no-administrator': { subject: 'You are no longer an administrator', sentences: by => [`${by} took the administration of this service from you. Your account and your campaigns stay as they are.`] },
}

/** To whoever's account an administrator changed. */
export function standingMail({ standing, by, origin }: { standing: Standing, by: string, origin: string }): MailContent {
  const { subject, sentences, action } = words[standing]
  return noticeMail({ subject, sentences: sentences(by), why, ...(action ? { action: { words: action, link: standing === 'reactivated' ? `${origin}/sign-in` : `${origin}/admin` } } : {}) })
}
