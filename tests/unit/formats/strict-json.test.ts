import { describe, expect, it } from 'vitest'
import { JsonProblem, parseStrictJson } from '#shared/formats/strict-json'

function problem(text: string): JsonProblem {
  try {
    parseStrictJson(text)
  }
  catch (error) {
    if (error instanceof JsonProblem) return error
    throw error
  }
  throw new Error('This was taken, though it should not have been.')
}

describe('strict JSON', () => {
  it('is JSON', () => {
    for (const text of ['{}', '[]', '"a\\"{b"', '-1.5e-3', 'null', '{"a":{"b":[1,{"a":2}]},"b":"a,b:c"}', '[{"a":1},{"a":2}]', '1e308', '1e-400', ' {"a" : [ ] } ']) expect(parseStrictJson(text)).toEqual(JSON.parse(text))
  })

  it.each<[string, string, string | undefined, RegExp]>([
    ['a key twice', '{"a":1,"b":2,"a":3}', 'a', /"a" stands there twice/],
    ['a key twice, once written with an escape', '{"a":1,"\\u0061":3}', 'a', /twice/],
    ['a key twice, deeper', '{"lines":[{"label":"x"},{"label":"y","sigma":1,"sigma":2}]}', 'lines.1.sigma', /twice/],
    ['a number beyond a double', '{"lines":[{"intensity":1e400}]}', 'lines.0.intensity', /1e400 is not a finite number/],
    ['a negative one', '[1,-1E+309]', '1', /-1E\+309 is not a finite number/],
    ['a number of four hundred digits', `[${'9'.repeat(400)}]`, '0', /not a finite number/],
    ['the key __proto__', '{"settings":{"__proto__":{"a":1}}}', 'settings.__proto__', /not taken/],
    ['depth', `${'['.repeat(41)}${']'.repeat(41)}`, undefined, /more than 40 levels deep at line 1, column 41/],
    ['depth without an end', '{"a":'.repeat(100_000), undefined, /levels deep/],
    ['a text that breaks off', '{"a":[1,2', undefined, /breaks off/],
    ['a missing comma, with its place', '{\n"a": 1\n"b": 2}', undefined, /line 3, column 1/],
    ['NaN', '{"a":[1,NaN,2]}', undefined, /neither NaN nor Infinity/],
  ])('refuses %s', (_, text, path, words) => {
    const found = problem(text)
    expect([found.path, found.message]).toEqual([path, expect.stringMatching(words)])
  })

  it('takes forty levels, and braces within a text are none', () => {
    expect(() => parseStrictJson(`${'['.repeat(40)}${']'.repeat(40)}`)).not.toThrow()
    expect(parseStrictJson(JSON.stringify('['.repeat(100)))).toBe('['.repeat(100))
  })
})
