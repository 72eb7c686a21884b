import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { tokenContrast, tokenToRgb } from '~/utils/oklch'

const css = readFileSync(new URL('../../../app/assets/css/tokens.css', import.meta.url), 'utf8')
const block = (start: string): Record<string, string> => {
  const body = css.slice(css.indexOf(start)).match(/\{([^}]*)\}/)![1]!
  return Object.fromEntries([...body.matchAll(/--([\w-]+):\s*([^;]+);/g)].map(match => [match[1]!, match[2]!]))
}
const raw = block(':root {')
const theme = (name: string): Record<string, string> => Object.fromEntries(Object.entries(block(`[data-theme='${name}'] {`))
  .map(([token, value]) => [token, value.startsWith('var(') ? raw[value.slice(6, -1)]! : value]))

describe.each(['day', 'night', 'dome'])('the %s theme', (name) => {
  const tokens = theme(name)
  const grounds = ['surface', 'surface-raised', 'surface-sunken', 'accent-soft', 'warn-soft', 'bad-soft']

  it.each(['ink', 'ink-muted'])('writes %s at 4.5:1 or more on every ground', (text) => {
    for (const ground of grounds) expect(tokenContrast(tokens[text]!, tokens[ground]!), ground).toBeGreaterThanOrEqual(4.5)
  })

  it.each(['accent', 'ok', 'warn', 'bad'])('writes %s at 4.5:1 or more on the page and on its own soft ground', (text) => {
    for (const ground of ['surface', 'surface-raised', ...(text === 'ok' ? [] : [`${text}-soft`])]) {
      expect(tokenContrast(tokens[text]!, tokens[ground]!), ground).toBeGreaterThanOrEqual(4.5)
    }
  })

  it('writes on a main button at 4.5:1 or more', () => {
    expect(tokenContrast(tokens['on-action']!, tokens.action!)).toBeGreaterThanOrEqual(4.5)
  })

  it('draws series and the edges of fields at 3:1 or more', () => {
    for (const mark of ['series-1', 'series-2', 'series-3', 'series-4', 'series-5', 'series-6', 'rule-strong']) {
      expect(tokenContrast(tokens[mark]!, tokens.surface!), mark).toBeGreaterThanOrEqual(3)
    }
  })
})

describe('tokenToRgb', () => {
  // Common practice: white, black and the sRGB red of CSS Color 4 (oklch 0.62796 0.25768 29.234).
  it.each([['1 0 0', 'rgb(255, 255, 255)'], ['0 0 0', 'rgb(0, 0, 0)'], ['0.62796 0.25768 29.234', 'rgb(255, 0, 0)']])('turns %s into %s', (token, rgb) => {
    expect(tokenToRgb(token)).toBe(rgb)
  })
})
