import { config } from '../../config'

/** Made from what the mail is about, so that the same mail sent twice is known as the same. */
export function messageIdFor(subjectKey: string): string {
  const domain = /@([^>\s]+)>?\s*$/.exec(config().mailFrom)?.[1] ?? 'localhost'
  return `<${subjectKey.replaceAll(':', '.')}@${domain}>`
}
