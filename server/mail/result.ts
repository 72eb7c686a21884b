import { flagWords } from '#shared/engine/flags'
import { printTemperature } from '#shared/engine/format-value'
import type { Interval, RetrievalResult, TemperatureValue } from '#shared/engine/types'
import { envelopePicture, pictureSize } from './envelope-picture'
import { button, escapeHtml, list, look, page, paragraph } from './html'
import type { MailContent } from './transport'

export interface ResultMailFacts {
  name: string
  campaign: string
  observedAt: Date | null
  revision: number
  phase: 'COMPLETED' | 'ERROR' | 'ABORTED'
  reason: string | null
  result: RetrievalResult | null
  link: string
  accountLink: string
}

const cid = 'lines@trotline'

/** The mail about one result, good or failed. */
export function resultMail(facts: ResultMailFacts): MailContent {
  const { result, link, accountLink } = facts
  const temperature = result?.temperature ?? null
  const printed = temperature ? printTemperature(temperature).text : facts.phase === 'ABORTED' ? 'Aborted' : 'No temperature'
  const headline = temperature ? `T = ${printed}` : printed
  const subject = `${printed}: ${facts.name}`
  const details = [...(temperature ? [intervalWords(temperature)] : [facts.reason ?? 'The fit gave no temperature.']), ...(result ? setWords(result) : [])]
  const flags = result?.flags.map(flag => flagWords[flag]) ?? []
  const cautions = result?.cautions ?? []
  const picture = result ? envelopePicture(result.lines) : null
  return {
    subject,
    accountLink,
    text: textOf({ headline, about: aboutWords(facts), details, flags, cautions, link, accountLink }),
    html: page({
      title: subject,
      accountLink,
      body: [
        `<p style="margin:0;color:${look.muted}">${escapeHtml(aboutWords(facts))}</p>`,
        `<h1 style="margin:4px 0 12px;font-family:${look.mono};font-weight:600;font-size:30px;color:${temperature ? look.ink : look.bad}">${escapeHtml(headline)}</h1>`,
        ...details.map(detail => paragraph(detail)),
        picture ? `<p style="margin:16px 0"><img src="cid:${cid}" width="${pictureSize.width}" height="${pictureSize.height}" alt="Line intensities by energy, with the fitted envelope" style="display:block;border:0"></p>` : '',
        flags.length > 0 ? `${paragraph('To look at:', look.accent)}${list(flags)}` : '',
        cautions.length > 0 ? `${paragraph('To keep in mind:', look.muted)}${list(cautions)}` : '',
        button(link, 'Open the result'),
      ].join('\n'),
    }),
    ...(picture ? { picture: { cid, content: picture } } : {}),
  }
}

function aboutWords({ name, campaign, observedAt, revision }: ResultMailFacts): string {
  const when = observedAt ? `, observed ${observedAt.toISOString().slice(0, 16).replace('T', ' ')} UTC` : ''
  return `${name}, ${campaign}${when}${revision > 1 ? `, revision ${revision}` : ''}`
}

const setWords = ({ strengthSet }: RetrievalResult): string[] => [strengthSet ? `Strength set ${strengthSet}.` : 'Strengths as given with the lines.']

function intervalWords({ uNoise, interval68 }: TemperatureValue): string {
  return `68 % interval ${boundsWords(interval68, bound => printTemperature({ value: bound, uNoise }).value)} K.`
}

function boundsWords([low, high]: Interval, print: (bound: number) => string): string {
  if (low === null && high === null) return 'open on both sides,'
  if (low === null) return `up to ${print(high!)}`
  return high === null ? `from ${print(low)} upwards,` : `${print(low)} to ${print(high)}`
}

interface Words { headline: string, about: string, details: string[], flags: string[], cautions: string[], link: string, accountLink: string }

function textOf({ headline, about, details, flags, cautions, link, accountLink }: Words): string {
  const section = (title: string, items: string[]) => items.length > 0 ? ['', title, ...items.map(item => `- ${item}`)] : []
  return [headline, about, '', ...details, ...section('To look at:', flags), ...section('To keep in mind:', cautions), '', link, '', `Mail preferences: ${accountLink}`].join('\n')
}
