import { describe, expect, it } from 'vitest'
import { flagsToBits } from '#shared/engine/flags'
import { printTemperature } from '#shared/engine/format-value'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { digestMail, type DigestRow } from '../../../../server/mail/digest'
import { escapeHtml } from '../../../../server/mail/html'
import { resultMail, type ResultMailFacts } from '../../../../server/mail/result'
import { syntheticInput } from '../../engine/helpers/tables'

const result = { ...retrieveFromLines(syntheticInput({ temperature: 190 })), strengthSet: 'brooke2016' }
const facts: ResultMailFacts = {
  name: 'HR-2025-11-03.csv', campaign: 'Ridge nights', observedAt: new Date('2025-11-03T22:30:00Z'), revision: 1, phase: 'COMPLETED', reason: null, result,
  link: 'https://t.example/retrievals/01A', accountLink: 'https://t.example/account',
}

describe('the mail about one result', () => {
  it('has the printed temperature in its subject and its text, and the way to the page', () => {
    const { subject, text, html } = resultMail(facts)
    const printed = printTemperature(result.temperature!).text
    expect(subject).toBe(`${printed}: HR-2025-11-03.csv`)
    for (const words of [`T = ${printed}`, 'Ridge nights, observed 2025-11-03 22:30 UTC', '68 % interval', 'Strength set brooke2016.', facts.link, facts.accountLink]) expect(text).toContain(words)
    for (const words of [`T = ${printed}`, `href="${facts.link}"`, 'src="cid:lines@trotline"']) expect(html).toContain(words)
  })

  it('says which side of the interval is open', () => {
    const open = (interval68: [number | null, number | null]) => resultMail({ ...facts, result: { ...result, temperature: { ...result.temperature!, interval68 } } }).text
    expect(open([null, 210])).toMatch(/68 % interval up to \d+(\.\d+)? K\./)
    expect(open([170, null])).toMatch(/68 % interval from \d+(\.\d+)? upwards, K\./)
    expect(open([null, null])).toContain('open on both sides')
  })

  it('says what was flagged, in words', () => {
    expect(resultMail({ ...facts, result: { ...result, flags: ['saturated'] } }).text).toMatch(/To look at:\n- [A-Z].*/i)
  })

  it('says why there is no temperature', () => {
    const { subject, text } = resultMail({ ...facts, phase: 'ERROR', reason: 'No line stands out of the noise.', result: { ...result, temperature: null } })
    expect(subject).toBe('No temperature: HR-2025-11-03.csv')
    expect(text).toContain('No line stands out of the noise.')
  })

  it('says who aborted', () => {
    const { subject, text, picture } = resultMail({ ...facts, phase: 'ABORTED', reason: 'Aborted by Ada.', result: null })
    expect([subject, picture]).toEqual(['Aborted: HR-2025-11-03.csv', undefined])
    expect(text).toContain('Aborted by Ada.')
  })

  it('lets no name write markup', () => {
    const { html } = resultMail({ ...facts, name: '<img src=x onerror=alert(1)>', campaign: '"><script>' })
    expect(html).not.toMatch(/<script|<img src=x/)
    expect(html).toContain(escapeHtml('<img src=x onerror=alert(1)>'))
  })
})

const row = (change: Partial<DigestRow>): DigestRow => ({ id: '01A', name: 'a', phase: 'COMPLETED', reason: null, temperature: 187.43, uNoise: 2.1, strengthSet: 'brooke2016', flagBits: 0, ...change })
const digest = (rows: DigestRow[], note = '') => digestMail({ campaign: 'Ridge nights', note, rows, link: 'https://t.example/batches/01B', accountLink: 'https://t.example/account', origin: 'https://t.example' })

describe('the mail about a batch', () => {
  it('counts, and names every failure and every abort with its reason', () => {
    const failures = Array.from({ length: 250 }, (_, i) => row({ name: `cloud ${i}.csv`, phase: 'ERROR', temperature: null, reason: `too weak ${i}` }))
    const { subject, text, html } = digest([row({}), ...failures, row({ name: 'late', phase: 'ABORTED', reason: 'Aborted by Ada.' }), row({ phase: 'HELD' })], 'second night')
    expect(subject).toBe('1 of 253 temperatures, 250 failed: Ridge nights')
    for (const { name, reason } of failures) {
      expect(text).toContain(`- ${name}: ${reason}\n`)
      expect(html).toContain(`<li>${name}: ${reason}</li>`)
    }
    expect(text).toContain('late: Aborted by Ada.')
    for (const words of ['1 done, 250 failed, 1 aborted, 1 waiting for you to complete them.', 'second night', `a: ${printTemperature({ value: 187.43, uNoise: 2.1 }).text}`]) expect(text).toContain(words)
  })

  it('speaks of no failures when there are none', () => {
    const { subject, text } = digest([row({}), row({ name: 'b' })])
    expect(subject).toBe('2 of 2 temperatures: Ridge nights')
    expect(text).not.toContain('Failed')
  })

  it('lists two hundred results and counts the rest', () => {
    const { text, html } = digest(Array.from({ length: 203 }, (_, i) => row({ name: `night ${i}` })))
    expect(text).toContain('and 3 more on the page')
    expect(html.match(/<a href="https:\/\/t.example\/retrievals\//g)).toHaveLength(200)
  })

  it('counts the flags over the results', () => {
    expect(digest([row({ flagBits: flagsToBits(['saturated']) }), row({ flagBits: flagsToBits(['saturated', 'blend']) }), row({})]).text).toMatch(/- 2 of 3: .+\n- 1 of 3: /)
  })
})
