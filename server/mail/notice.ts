import { button, escapeHtml, page, paragraph } from './html'
import type { MailContent } from './transport'

export interface Notice {
  subject: string
  /** One sentence each. */
  sentences: string[]
  action?: { link: string, words: string }
  /** Why one gets it: nobody chose to. */
  why: string
}

/** A short mail about one's account or one's place in a campaign, which no preference switches off. */
export const noticeMail = ({ subject, sentences, action, why }: Notice): MailContent => ({
  subject,
  text: [...sentences, ...(action ? ['', `${action.words}:`, action.link] : []), '', why].join('\n'),
  html: page({
    title: subject,
    why,
    body: [
      `<h1 style="margin:0 0 12px;font-size:24px;font-weight:600">${escapeHtml(subject)}</h1>`,
      ...sentences.map(sentence => paragraph(sentence)),
      action ? button(action.link, action.words) : '',
    ].join('\n'),
  }),
})
