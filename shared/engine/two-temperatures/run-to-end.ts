/**
 * Runs a computation that can be taken in steps to its end at once.
 *
 * @returns what the generator returns
 * @example
 * runToEnd((function* () { yield; return 7 })()) // => 7
 */
export function runToEnd<T>(steps: Generator<unknown, T>): T {
  for (;;) {
    const step = steps.next()
    if (step.done) return step.value
  }
}
