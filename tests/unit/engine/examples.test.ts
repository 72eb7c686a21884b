import { describe, expect, it } from 'vitest'

const sources = import.meta.glob<string>(['../../../shared/engine/**/*.ts'], { eager: true, query: '?raw', import: 'default' })
/** Folders in which every exported function must show a runnable example; elsewhere those that are shown must be true. */
const shownInFull = /engine\/(optimise|special|random)\//
const modules = import.meta.glob<Record<string, unknown>>(['../../../shared/engine/**/*.ts'], { eager: true })

interface Example { name: string, lines: string[] }

/** The `@example` blocks of a file, each with the function that it stands before. */
function examplesOf(source: string): Example[] {
  return [...source.matchAll(/\/\*\*((?:(?!\*\/)[\s\S])*?)\*\/\s*export (?:abstract )?(?:function\*?|class) (\w+)/g)].flatMap(([, comment, name]) => {
    const text = comment.split('@example')[1]
    return text === undefined ? [] : [{ name, lines: text.split('\n').map(line => line.replace(/^\s*\* ?/, '')).filter(line => line.trim() !== '' && !line.startsWith('@')) }]
  })
}

const exportedFunctions = (source: string) => [...source.matchAll(/^export (?:abstract )?(?:function\*?|class) (\w+)/gm)].map(match => match[1])

/** Plain numbers and arrays, whatever kind of array it was. */
function plain(value: unknown): unknown {
  if (ArrayBuffer.isView(value)) return Array.from(value as Float64Array)
  return value
}

function same(found: unknown, wanted: unknown): void {
  if (typeof wanted === 'number') {
    expect(typeof found).toBe('number')
    return expect(Math.abs(found as number - wanted)).toBeLessThanOrEqual(1e-12 * Math.max(1, Math.abs(wanted)))
  }
  if (Array.isArray(wanted)) {
    expect(found).toHaveLength(wanted.length)
    return wanted.forEach((value, i) => same((found as unknown[])[i], value))
  }
  expect(found).toEqual(wanted)
}

/** Runs the lines with every export of the engine in sight, those of the file itself first; a line "expression // => value" is a claim. */
function run(lines: string[], path = ''): number {
  const scope = Object.assign({}, ...Object.values(modules), modules[path]) as Record<string, unknown>
  let claims = 0
  const check = (found: unknown, wanted: unknown) => {
    claims++
    same(plain(found), plain(wanted))
  }
  const body = lines.map((line) => {
    const claim = /^(.*?)\s*\/\/ => (.*)$/.exec(line)
    return claim ? `check((${claim[1]}), (${claim[2]}))` : line
  }).join('\n')
  new Function('check', ...Object.keys(scope), `'use strict'\n${body}`)(check, ...Object.values(scope))
  return claims
}

describe.each(Object.entries(sources).filter(([path, source]) => shownInFull.test(path) || source.includes('@example')))('the examples in %s', (path, source) => {
  const examples = examplesOf(source)

  it.runIf(shownInFull.test(path))('stand before every exported function', () => {
    expect(examples.map(example => example.name)).toEqual(exportedFunctions(source))
  })

  it.each(examples.map(example => [example.name, example.lines] as const))('of %s come true', (_, lines) => {
    expect(run(lines, path)).toBeGreaterThan(0)
  })
})

it('fails for an example that is not true', () => {
  expect(() => run(['erf(0) // => 1'])).toThrow()
  expect(() => run(['[1, 2].map(x => 2 * x) // => [2, 5]'])).toThrow()
})
