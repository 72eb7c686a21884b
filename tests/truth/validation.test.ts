import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { validationPage } from './validation/page'
import type { SectionResult } from './validation/page'
import { passes } from './validation/report'
import type { Section } from './validation/report'

/** Set by `npm run validate`: run everything at full size and write the page. */
const writing = process.env.TROTLINE_WRITE_VALIDATION === '1'
const page = fileURLToPath(new URL('../../docs/VALIDATION.md', import.meta.url))
const sections = Object.values(import.meta.glob<{ section: Section }>('./validation/sections/*.ts', { eager: true })).map(module => module.section).sort((a, b) => a.order - b.order)

describe('the validation', () => {
  const results: SectionResult[] = []

  it.each(sections.map(section => [section.title, section] as const))('%s holds every bar', { timeout: 1_800_000 }, async (_, section) => {
    const report = await section.run(writing ? 'full' : 'gate')
    results.push({ section, report })
    expect(report.checks.length).toBeGreaterThan(0)
    expect(report.checks.filter(check => !passes(check))).toEqual([])
  })

  it('stands on its page, section by section', () => {
    if (writing && results.length === sections.length) writeFileSync(page, validationPage(results))
    expect(existsSync(page)).toBe(true)
    const headings = [...readFileSync(page, 'utf8').matchAll(/^## (.+)$/gm)].map(match => match[1])
    expect(headings).toEqual(sections.map(section => section.title))
  })
})
