import { onKeyStroke, useLocalStorage } from '@vueuse/core'
import type { railEntriesFor } from '~/utils/rail-entries'

const typing = (target: EventTarget | null) => target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName))

/** `?` opens the list of shortcuts, `g` and a letter goes to a page. They can be switched off (WCAG 2.1.4). */
export function useShortcuts(entries: () => ReturnType<typeof railEntriesFor>) {
  const open = ref(false)
  const enabled = useLocalStorage('trotline-shortcuts', true, { initOnMounted: true })
  let afterG = 0
  onKeyStroke((event) => {
    if (typing(event.target) || event.ctrlKey || event.metaKey || event.altKey) return
    if (event.key === '?') open.value = true
    if (!enabled.value || open.value) return
    const entry = Date.now() - afterG < 1500 ? entries().find(candidate => candidate.key === event.key) : undefined
    afterG = event.key === 'g' ? Date.now() : 0
    if (entry) void navigateTo(entry.to)
  })
  return { open, enabled }
}
