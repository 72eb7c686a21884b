/** One comparison with its bar. */
export interface Check {
  /** What was compared, a noun phrase. */
  what: string
  found: number
  bar: number
  /** `least`: found must be at least the bar; `most`: at most. */
  sense: 'least' | 'most'
}

/** A table of a section, cells ready to print. */
export interface Table {
  caption?: string
  columns: string[]
  rows: string[][]
}

export interface Report { tables: Table[], checks: Check[] }

/**
 * One part of the validation. A file in `sections/` exports one as `section`; the gate (`validation.test.ts`) and the page
 * (docs/VALIDATION.md, by `npm run validate`) run the same code, so what the page says is what the tests demand.
 */
export interface Section {
  /** Sections are ordered by this number. */
  order: number
  title: string
  /** What is compared with what, in Markdown. */
  about: string
  /** @param size `gate`: as often as every test run can bear; `full`: for the page */
  run: (size: 'gate' | 'full') => Report | Promise<Report>
}

export function passes({ found, bar, sense }: Check): boolean {
  return sense === 'least' ? found >= bar : found <= bar
}
