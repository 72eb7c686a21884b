import { shallowRef } from 'vue'

/** Runs questions whose answer is only wanted if no newer one was asked meanwhile. */
export function useLatest<A extends unknown[], T>(work: (...args: A) => Promise<T>) {
  const value = shallowRef<T | null>(null)
  const problem = shallowRef<string | null>(null)
  const busy = shallowRef(false)
  let turn = 0

  async function run(...args: A) {
    const mine = ++turn
    busy.value = true
    try {
      const answer = await work(...args)
      if (mine === turn) [value.value, problem.value] = [answer, null]
    }
    catch (thrown) {
      if (mine === turn) [value.value, problem.value] = [null, thrown instanceof Error ? thrown.message : String(thrown)]
    }
    finally {
      if (mine === turn) busy.value = false
    }
  }

  function clear() {
    turn += 1
    value.value = null
    problem.value = null
    busy.value = false
  }

  return { value, problem, busy, run, clear }
}
