export type Changes = Record<string, { from: unknown, to: unknown }>

/** What the logbook says of a change: each field that differs, from what to what. */
export function changesBetween<Row extends object>(before: Row, wanted: Partial<Row>): Changes {
  const changes: Changes = {}
  for (const key of Object.keys(wanted) as (keyof Row & string)[]) {
    const from = before[key]
    const to = wanted[key]
    if (to !== undefined && JSON.stringify(from) !== JSON.stringify(to)) changes[key] = { from, to }
  }
  return changes
}
