import type { FieldWords } from '~/utils/objects/field-words'
import { plainCopy, putAt, sameValue, valueAt } from '~/utils/objects/paths'

/** One field in which what one wrote and what stands there now differ. */
export interface ConflictRow {
  path: string
  label: string
  mine: string
  now: string
  /** Both were changed since the form was opened, so nobody but the person can choose. */
  both: boolean
  keep: 'mine' | 'now'
}

/** What is to be chosen: a field that only one side changed is decided already, and can be decided otherwise. */
export function conflictRows(fields: FieldWords[], { base, mine, now }: { base: unknown, mine: unknown, now: unknown }): ConflictRow[] {
  return fields.flatMap(({ path, label, words }) => {
    const [began, written, stands] = [base, mine, now].map(values => valueAt(values, path))
    if (sameValue(written, stands)) return []
    const changedByMe = !sameValue(began, written)
    return [{ path, label, mine: words(written), now: words(stands), both: changedByMe && !sameValue(began, stands), keep: changedByMe ? 'mine' as const : 'now' as const }]
  })
}

/** The values that come of the choices. */
export function settle<Values>(rows: ConflictRow[], mine: Values, now: Values): Values {
  const settled = plainCopy(mine)
  for (const row of rows) if (row.keep === 'now') putAt(settled, row.path, plainCopy(valueAt(now, row.path)))
  return settled
}
