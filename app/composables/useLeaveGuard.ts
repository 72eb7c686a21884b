/** Asks before a changed form is left: by a link of ours with a dialog, by closing the window with the browser's own. */
export function useLeaveGuard(dirty: () => boolean) {
  const asking = ref(false)
  let answer: ((leave: boolean) => void) | null = null

  const decide = (leave: boolean) => {
    asking.value = false
    answer?.(leave)
    answer = null
  }
  const ask = () => {
    if (!dirty()) return true
    answer?.(false)
    asking.value = true
    return new Promise<boolean>((resolve) => { answer = resolve })
  }
  onBeforeRouteLeave(ask)
  onBeforeRouteUpdate((to, from) => to.path === from.path || ask())
  useEventListener('beforeunload', (event) => { if (dirty()) event.preventDefault() })

  return { asking, stay: () => decide(false), leave: () => decide(true) }
}
