import { bitsToFlags, flagWords } from '#shared/engine/flags'
import { printTemperature } from '#shared/engine/format-value'
import type { Phase } from '#shared/types/phases'
import { button, escapeHtml, list, look, page, paragraph } from './html'
import type { MailContent } from './transport'

export interface DigestRow {
  id: string
  name: string
  phase: Phase
  reason: string | null
  temperature: number | null
  uNoise: number | null
  strengthSet: string | null
  flagBits: number
}
export interface DigestMailFacts { campaign: string, note: string, rows: DigestRow[], link: string, accountLink: string, origin: string }

const shownRows = 200

/** One mail for a whole batch. Failures are named one by one, whatever their number. */
export function digestMail({ campaign, note, rows, link, accountLink, origin }: DigestMailFacts): MailContent {
  const done = rows.filter(row => row.phase === 'COMPLETED')
  const failed = rows.filter(row => row.phase === 'ERROR')
  const subject = `${done.length} of ${rows.length} temperatures${failed.length > 0 ? `, ${failed.length} failed` : ''}: ${campaign}`
  const counts = countWords(rows)
  const failures = failed.map(row => `${row.name}: ${row.reason ?? 'no temperature'}`)
  const aborted = rows.filter(row => row.phase === 'ABORTED').map(row => `${row.name}: ${row.reason ?? 'aborted'}`)
  const flags = flagCounts(done)
  const more = done.length > shownRows ? [`and ${done.length - shownRows} more on the page`] : []
  return {
    subject,
    accountLink,
    text: [
      subject, ...(note ? [note] : []), counts,
      ...section('Failed:', failures), ...section('Aborted:', aborted), ...section('To look at:', flags),
      ...section('Results:', [...done.slice(0, shownRows).map(row => `${row.name}: ${printed(row)}`), ...more]),
      '', link, '', `Mail preferences: ${accountLink}`,
    ].join('\n'),
    html: page({
      title: subject,
      accountLink,
      body: [
        `<h1 style="margin:0 0 8px;font-size:24px;font-weight:600">${escapeHtml(subject)}</h1>`,
        note ? paragraph(note, look.muted) : '',
        paragraph(counts),
        failures.length > 0 ? `${paragraph('Failed:', look.bad)}${list(failures)}` : '',
        aborted.length > 0 ? `${paragraph('Aborted:', look.muted)}${list(aborted)}` : '',
        flags.length > 0 ? `${paragraph('To look at:', look.accent)}${list(flags)}` : '',
        table(done.slice(0, shownRows), origin),
        ...more.map(words => paragraph(words, look.muted)),
        button(link, 'Open the batch'),
      ].join('\n'),
    }),
  }
}

const section = (title: string, items: string[]): string[] => items.length > 0 ? ['', title, ...items.map(item => `- ${item}`)] : []

const printed = ({ temperature, uNoise }: DigestRow): string => temperature === null ? 'no temperature' : printTemperature({ value: temperature, uNoise }).text

const phaseWords: Partial<Record<Phase, string>> = { COMPLETED: 'done', ERROR: 'failed', ABORTED: 'aborted', HELD: 'waiting for you to complete them', PENDING: 'drafts' }

function countWords(rows: DigestRow[]): string {
  const parts = Object.entries(phaseWords).flatMap(([phase, words]) => {
    const count = rows.filter(row => row.phase === phase).length
    return count > 0 ? [`${count} ${words}`] : []
  })
  return `${parts.join(', ')}.`
}

function flagCounts(rows: DigestRow[]): string[] {
  const counts = new Map<string, number>()
  for (const flag of rows.flatMap(row => bitsToFlags(row.flagBits))) counts.set(flagWords[flag], (counts.get(flagWords[flag]) ?? 0) + 1)
  return [...counts].map(([words, count]) => `${count} of ${rows.length}: ${words}`)
}

function table(rows: DigestRow[], origin: string): string {
  const cell = `padding:4px 12px 4px 0;border-bottom:1px solid ${look.rule};text-align:left`
  const body = rows.map(row => `<tr><td style="${cell}"><a href="${escapeHtml(`${origin}/retrievals/${row.id}`)}" style="color:${look.ink}">${escapeHtml(row.name)}</a></td>`
    + `<td style="${cell};font-family:${look.mono};white-space:nowrap">${escapeHtml(printed(row))}</td><td style="${cell};color:${look.muted}">${escapeHtml(row.strengthSet ?? '')}</td></tr>`)
  return rows.length === 0 ? '' : `<table cellpadding="0" cellspacing="0" style="width:100%;border-collapse:collapse;font-size:14px"><tr><th style="${cell}">Spectrum</th><th style="${cell}">Temperature</th><th style="${cell}">Strength set</th></tr>${body.join('')}</table>`
}
