/** What is wrong with a JSON text, where, and how to mend it. */
export class JsonProblem extends Error {
  constructor(message: string, public readonly path?: string) {
    super(message)
    this.name = 'JsonProblem'
  }
}

/** Nothing that is sent here goes deeper than a dozen levels. */
const maxDepth = 40
const maxPath = 120

/**
 * Parses JSON and refuses what the standard parser takes in silence and changes: a key that stands twice (the first value would be
 * lost), a number beyond the range of a double (it would become Infinity), the key `__proto__`. Throws `JsonProblem`.
 */
export function parseStrictJson(text: string): unknown {
  checkDepth(text)
  let value: unknown
  try {
    value = JSON.parse(text)
  }
  catch (error) {
    throw new JsonProblem(syntaxWords(error as Error, text))
  }
  new Scanner(text).run()
  return value
}

/** By counting brackets outside of strings: before the parser's own memory goes into them. */
function checkDepth(text: string): void {
  let depth = 0
  for (let at = 0; at < text.length; at++) {
    const code = text.charCodeAt(at)
    if (code === 34) at = stringEnd(text, at)
    else if (code === 91 || code === 123) { if (++depth > maxDepth) throw new JsonProblem(`It is nested more than ${maxDepth} levels deep${placeWords(text, at)}.`) }
    else if (code === 93 || code === 125) depth--
  }
}

function stringEnd(text: string, start: number): number {
  let at = start + 1
  while (at < text.length && text.charCodeAt(at) !== 34) at += text.charCodeAt(at) === 92 ? 2 : 1
  return at
}

/** The parser's own word for it, with line and column in place of a bare position. */
function syntaxWords({ message }: Error, text: string): string {
  if (/[^"\w](NaN|-?Infinity)[^"\w]/.test(text)) return 'JSON knows neither NaN nor Infinity: leave those pixels out.'
  const position = /at position (\d+)/.exec(message)?.[1]
  const breaksOff = /end of JSON input/.test(message) || Number(position) >= text.length
  const what = message.replace(/,? (\.\.\.)?".*$/s, '').replace(/ (in JSON )?at position \d+.*$/s, '').slice(0, 80)
  return `${what}${breaksOff ? ': the text breaks off' : position ? placeWords(text, Number(position)) : ''}.`
}

function placeWords(text: string, at: number): string {
  const before = text.slice(0, at)
  return ` at line ${before.split('\n').length}, column ${at - before.lastIndexOf('\n')}`
}

interface Level { keys: Set<string> | null, name: string | number }

/** Walks a text that is known to be valid JSON. */
class Scanner {
  private readonly levels: Level[] = []
  private expectsKey = false

  constructor(private readonly text: string) {}

  run(): void {
    for (let at = 0; at < this.text.length; at++) at = this.step(at)
  }

  /** Takes in what begins here; gives back where it ends. */
  private step(at: number): number {
    const code = this.text.charCodeAt(at)
    switch (code) {
      case 34: return this.string(at)
      case 91: this.levels.push({ keys: null, name: 0 }); break
      case 123: this.levels.push({ keys: new Set(), name: '' }); this.expectsKey = true; break
      case 93: case 125: this.levels.pop(); this.expectsKey = false; break
      case 44: this.next(); break
      case 58: this.expectsKey = false; break
      default: if (code === 45 || (code >= 48 && code <= 57)) return this.number(at)
    }
    return at
  }

  private next(): void {
    const level = this.levels.at(-1)!
    if (level.keys) this.expectsKey = true
    else (level.name as number)++
  }

  private string(start: number): number {
    const end = stringEnd(this.text, start)
    if (this.expectsKey) this.key(JSON.parse(this.text.slice(start, end + 1)) as string)
    return end
  }

  private key(name: string): void {
    const level = this.levels.at(-1)!
    const twice = level.keys!.has(name)
    level.keys!.add(name)
    level.name = name
    if (twice) throw new JsonProblem(`The key "${name.slice(0, 60)}" stands there twice, and only one of its values could count. Remove one.`, this.path())
    if (name === '__proto__') throw new JsonProblem('The key "__proto__" is not taken.', this.path())
  }

  private number(start: number): number {
    let end = start + 1
    let exponent = false
    for (; end < this.text.length; end++) {
      const code = this.text.charCodeAt(end)
      if (code === 101 || code === 69) exponent = true
      else if (!(code >= 48 && code <= 57) && code !== 43 && code !== 45 && code !== 46) break
    }
    if ((exponent || end - start > 300) && !Number.isFinite(Number(this.text.slice(start, end)))) {
      throw new JsonProblem(`${this.text.slice(start, Math.min(end, start + 40))} is not a finite number here: it is beyond the range of double precision (about 1.8e308).`, this.path())
    }
    return end - 1
  }

  private path = (): string => this.levels.map(({ name }) => String(name)).join('.').slice(0, maxPath)
}
