/** Ids are given before commits. A smaller id that has not appeared by then was rolled back. */
export const patienceMs = 2000

interface Numbered { id: number, ageMs: number }

/**
 * How many of these rows, in order of id, may be told: up to the first gap behind which a smaller id may still be committed. So whoever
 * has heard an id has heard all before it, and can go on from there.
 */
export function countSettled(rows: Numbered[], after: number): number {
  let expected = after + 1
  for (const [index, { id, ageMs }] of rows.entries()) {
    if (id !== expected && ageMs < patienceMs) return index
    expected = id + 1
  }
  return rows.length
}
