const powersOfTen = Float64Array.from({ length: 23 }, (_, n) => Number(`1e${n}`))
const numberForm = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/
const DOT = 46
const COMMA = 44

/** Reads decimal numbers out of a long text without cutting it up. Correctly rounded, like `Number()`. */
export class NumberReader {
  /** The decimal mark of this file, '' until the first one was seen. */
  decimalMark: '' | '.' | ',' = ''

  /** The number that fills text[start, end); NaN when it is none or has the other decimal mark. */
  read(text: string, start: number, end: number): number {
    let at = start
    const first = text.charCodeAt(at)
    if (first === 45 || first === 43) at++
    let mantissa = 0
    let digits = 0
    let decimals = -1
    for (; at < end; at++) {
      const code = text.charCodeAt(at)
      if (code >= 48 && code <= 57) {
        mantissa = mantissa * 10 + (code - 48)
        digits++
        if (decimals >= 0) decimals++
      }
      else if ((code === DOT || code === COMMA) && decimals < 0) {
        if (!this.accepts(code)) return Number.NaN
        decimals = 0
      }
      else { break }
    }
    // Up to 15 digits and 10^22 are exact doubles, so that one division rounds once, as it should.
    if (at < end || digits === 0 || digits > 15) return slowRead(text.slice(start, end))
    const size = decimals > 0 ? mantissa / powersOfTen[decimals]! : mantissa
    return first === 45 ? -size : size
  }

  private accepts(code: number): boolean {
    const mark = code === DOT ? '.' : ','
    if (this.decimalMark === '') this.decimalMark = mark
    return this.decimalMark === mark
  }
}

/** Exponents (E, and D as Fortran writes it) and long digit strings. */
function slowRead(cell: string): number {
  const plain = cell.replace(',', '.').toLowerCase().replace('d', 'e')
  return numberForm.test(plain) ? Number(plain) : Number.NaN
}
