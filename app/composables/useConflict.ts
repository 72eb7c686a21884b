import type { EditFormOptions } from '~/composables/useEditForm'
import type { ApiError } from '~/utils/api-error'
import { conflictRows, settle, type ConflictRow } from '~/utils/objects/conflict'
import { plainCopy } from '~/utils/objects/paths'

interface State<Values> { base: Ref<Values>, values: Values, version: Ref<number> }

/** Somebody stored another state of the row that a form shows: both sides, field by field, and the choice. */
export function useConflict<Values extends object>({ fields, fromCurrent }: Pick<EditFormOptions<Values>, 'fields' | 'fromCurrent'>, { base, values, version }: State<Values>) {
  const rows = ref<ConflictRow[]>([])
  const isOpen = ref(false)
  let now: Values | null = null
  let newest = 0

  /** @returns false when the error is of another kind */
  function open(error: ApiError): boolean {
    const current = error.current as { version: number } | undefined
    if (error.code !== 'stale_version' || !current || !fromCurrent) return false
    now = fromCurrent(current as never)
    newest = current.version
    rows.value = conflictRows(fields, { base: base.value, mine: values, now })
    isOpen.value = true
    return true
  }

  /** Takes the choices into the form, which then stands on the newest version. */
  function resolve(): void {
    if (!now) return
    Object.assign(values, settle(rows.value, plainCopy(values), now))
    base.value = plainCopy(now)
    version.value = newest
    isOpen.value = false
  }

  return { rows, isOpen, open, resolve }
}
