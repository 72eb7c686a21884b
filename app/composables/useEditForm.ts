import type * as z from 'zod'
import type { FieldProblem } from '#shared/types/error-codes'
import type { FieldWords } from '~/utils/objects/field-words'
import { plainCopy, sameValue, valueAt } from '~/utils/objects/paths'
import { problemsOf, sameProblem } from '~/utils/objects/problems'

export interface EditFormOptions<Values extends object> {
  /** The server's own schema of the whole form. */
  schema: z.ZodType<Values>
  /** Rules that need more than the values, such as a line list. */
  alsoProblems?: (values: Values) => FieldProblem[]
  fields: FieldWords[]
  initial: Values
  /** Of the row that is changed; left out for a new one. */
  version?: number
  /** Stores the checked values; goes on to another page by itself. */
  save: (values: Values, version: number) => Promise<unknown>
  /** The row of a stale-version answer as form values. */
  fromCurrent?: (current: never) => Values
}

/**
 * A form as all pages use it: checked while one types, asking before it is left, and settling field by field with what
 * somebody else stored meanwhile.
 */
export function useEditForm<Values extends object>(options: EditFormOptions<Values>) {
  const base = shallowRef(plainCopy(options.initial))
  const version = ref(options.version ?? 0)
  const values = reactive(plainCopy(options.initial)) as Values
  const tried = ref(false)
  const stored = ref(false)
  const fromServer = shallowRef<(FieldProblem & { at: unknown })[]>([])

  const check = (candidate: Values): FieldProblem[] => [...problemsOf(options.schema, candidate), ...options.alsoProblems?.(candidate) ?? []]
  const problems = computed(() => check(plainCopy(values)))
  /** What was wrong before anything was typed is not held against one who has only begun. */
  const before = computed(() => check(base.value))
  const shown = computed(() => [
    ...problems.value.filter(problem => tried.value || !before.value.some(known => sameProblem(known, problem))),
    ...fromServer.value.filter(({ path, at }) => sameValue(valueAt(values, path), at)),
  ])
  const problem = (path: string): string | undefined => shown.value.find(item => item.path === path || item.path.startsWith(`${path}.`))?.message
  const dirty = computed(() => !stored.value && !sameValue(values, base.value))

  const conflict = useConflict(options, { base, values, version })
  const { busy, error, submit: send } = useSubmit(async () => {
    const checked = options.schema.parse(plainCopy(values))
    await options.save(checked, version.value)
  })

  async function submit(form?: HTMLElement | null): Promise<void> {
    tried.value = true
    if (problems.value.length > 0) return focusFirstProblem(form)
    stored.value = true
    await send()
    if (!error.value) return
    stored.value = false
    if (conflict.open(error.value)) error.value = null
    else if (error.value.fields.length > 0) {
      fromServer.value = error.value.fields.map(field => ({ ...field, at: plainCopy(valueAt(values, field.path)) }))
      await focusFirstProblem(form)
    }
  }

  return { values, fields: options.fields, problem, shown, dirty, tried, busy, error, conflict, submit }
}

export type EditForm = ReturnType<typeof useEditForm<object>>

async function focusFirstProblem(form?: HTMLElement | null): Promise<void> {
  await nextTick()
  form?.querySelector<HTMLElement>('[aria-invalid=true]')?.focus()
}
