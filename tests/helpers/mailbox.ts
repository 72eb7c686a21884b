export interface ReceivedMail { subject: string, text: string, html: string, to: { address: string }[], headers: Record<string, string>, attachments?: { contentType: string, contentId: string }[] }

/** What the test mail server holds for an address. */
export async function mailsTo(maildevUrl: string, address: string): Promise<ReceivedMail[]> {
  const all = await (await fetch(`${maildevUrl}/api/email`)).json() as ReceivedMail[]
  return all.filter(mail => mail.to.some(to => to.address === address))
}
