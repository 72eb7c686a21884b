import { useTokenVersion } from '~/composables/useChartTokens'

/** Paper is always day: pictures are drawn again in its colours for the time of printing. */
export default defineNuxtPlugin(() => {
  const version = useTokenVersion()
  const root = document.documentElement
  let before: string | undefined
  window.addEventListener('beforeprint', () => {
    before ??= root.dataset.theme
    root.dataset.theme = 'day'
    version.value++
  })
  window.addEventListener('afterprint', () => {
    if (before) root.dataset.theme = before
    before = undefined
    version.value++
  })
})
