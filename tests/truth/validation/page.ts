import { execFileSync } from 'node:child_process'
import { engineVersion } from '#shared/engine/version'
import { passes } from './report'
import type { Check, Report, Section, Table } from './report'

export interface SectionResult { section: Section, report: Report }

const row = (cells: readonly string[]) => `| ${cells.join(' | ')} |`

function tableText({ caption, columns, rows }: Table): string {
  return [...(caption ? [`${caption}:`, ''] : []), row(columns), row(columns.map(() => '---')), ...rows.map(row)].join('\n')
}

function verdict(checks: Check[]): string {
  const failed = checks.filter(check => !passes(check))
  if (failed.length === 0) return `**${checks.length} of ${checks.length} comparisons hold.**`
  return [`**${failed.length} of ${checks.length} comparisons fail:**`, ...failed.map(({ what, found, bar }) => `- ${what}: ${found}, required ${bar}`)].join('\n')
}

const scipyVersion = () => execFileSync('/usr/bin/python3', ['-c', 'import scipy; print(scipy.__version__)'], { encoding: 'utf8' }).trim()

/** docs/VALIDATION.md */
export function validationPage(results: SectionResult[]): string {
  const head = `# Validation

Written by \`npm run validate\` from the comparisons in \`tests/truth/validation/sections\`, which are also gates of the test run.
Engine ${engineVersion}, Node ${process.versions.node}, compared with scipy ${scipyVersion()}, published reference values and exact arithmetic.
`
  const parts = results.map(({ section, report }) => [`## ${section.title}`, section.about, verdict(report.checks), ...report.tables.map(tableText)].join('\n\n'))
  return `${[head.trimEnd(), ...parts].join('\n\n')}\n`
}
