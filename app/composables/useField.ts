import type { ComputedRef, InjectionKey } from 'vue'

export interface FieldContext { id: string, describedBy: string | undefined, invalid: boolean, required: boolean }
const fieldKey: InjectionKey<ComputedRef<FieldContext>> = Symbol('field')

export const provideField = (field: ComputedRef<FieldContext>): void => provide(fieldKey, field)

/** The attributes that tie a control to the label, hint and error of the BaseField around it. */
export function useFieldAttributes() {
  const field = inject(fieldKey, null)
  return computed(() => field
    ? { 'id': field.value.id, 'aria-describedby': field.value.describedBy, 'aria-invalid': field.value.invalid || undefined, 'required': field.value.required || undefined }
    : {})
}
