/** The number itself when it is finite, else null: nothing else may leave the engine. */
export function finiteOrNull(value: number | null | undefined): number | null {
  return value !== null && value !== undefined && Number.isFinite(value) ? value : null
}
