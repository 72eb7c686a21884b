import { createTransport, type Transporter } from 'nodemailer'
import { config } from '../config'

export interface MailContent {
  subject: string
  text: string
  html: string
  /** Of mails that are chosen there; without it the mail is one that nobody can switch off. */
  accountLink?: string
  picture?: { cid: string, content: Buffer }
}
export interface Mail extends MailContent {
  to: { name: string, address: string }
  messageId: string
}

let opened: Transporter | undefined

/** One kept connection: a mail server takes a night's results over one line. */
const transport = (): Transporter => (opened ??= createTransport({
  url: config().smtpUrl, pool: true, maxConnections: 1, maxMessages: 200, connectionTimeout: 5000, greetingTimeout: 5000, socketTimeout: 15_000,
}))

/** Resolves when the mail server has taken the mail. */
export async function sendMail({ to, messageId, subject, text, html, accountLink, picture }: Mail): Promise<void> {
  await transport().sendMail({
    from: config().mailFrom, to, messageId, subject, text, html,
    ...(accountLink ? { list: { unsubscribe: { url: accountLink, comment: 'Mail preferences' } } } : {}),
    attachments: picture ? [{ filename: 'lines.png', content: picture.content, cid: picture.cid, contentType: 'image/png', contentDisposition: 'inline' as const }] : [],
  })
}

export function closeMail(): void {
  opened?.close()
  opened = undefined
}
