/** The first rows of numbers in a text file, for the question which column is which. */
export function firstRows(text: string, count = 4): number[][] {
  const rows: number[][] = []
  for (const line of text.split(/\r\n?|\n/)) {
    const cells = line.trim().split(line.includes(';') ? /\s*;\s*/ : /[,\s]+/).filter(Boolean)
    const numbers = cells.map(Number)
    if (numbers.length < 2 || numbers.some(Number.isNaN)) continue
    rows.push(numbers)
    if (rows.length === count) break
  }
  return rows
}
