import { Chart } from 'chart.js'
import { useTokenVersion } from '~/composables/useChartTokens'
import { toCsv, type CsvValue } from '~/utils/csv'
import { download } from '~/utils/download'

/** What the frame around a chart does with it: zoom by keys, download, print. The chart itself is found by its canvas. */
export function useChartFrame(stage: Readonly<Ref<HTMLElement | null>>, csv: () => { name: string, columns: string[], rows: CsvValue[][] }) {
  const version = useTokenVersion()
  const chart = () => {
    const canvas = stage.value?.querySelector('canvas')
    return canvas ? Chart.getChart(canvas) : undefined
  }
  const moves: Record<string, (target: Chart) => void> = {
    '+': target => target.zoom(1.25),
    '=': target => target.zoom(1.25),
    '-': target => target.zoom(0.8),
    '0': target => target.resetZoom(),
    'Escape': target => target.resetZoom(),
    'ArrowLeft': target => target.pan({ x: 60 }),
    'ArrowRight': target => target.pan({ x: -60 }),
    'ArrowUp': target => target.pan({ y: 40 }),
    'ArrowDown': target => target.pan({ y: -40 }),
  }
  function keydown(event: KeyboardEvent) {
    const move = moves[event.key]
    const target = chart()
    if (!move || !target || event.ctrlKey || event.metaKey) return
    event.preventDefault()
    move(target)
  }
  function savePng(name: string) {
    const canvas = stage.value?.querySelector('canvas')
    if (!canvas) return
    const copy = document.createElement('canvas')
    copy.width = canvas.width
    copy.height = canvas.height
    const context = copy.getContext('2d')
    if (!context) return
    context.fillStyle = getComputedStyle(document.body.parentElement!).backgroundColor
    context.fillRect(0, 0, copy.width, copy.height)
    context.drawImage(canvas, 0, 0)
    download(`${name}.png`, copy.toDataURL('image/png'))
  }
  function saveCsv() {
    const { name, columns, rows } = csv()
    download(`${name}.csv`, new Blob([toCsv(columns, rows)], { type: 'text/csv;charset=utf-8' }))
  }
  /** Printing by script leaves no time to redraw, so the day colours are drawn before it starts. */
  async function print() {
    const root = document.documentElement
    const theme = root.dataset.theme
    root.dataset.theme = 'day'
    version.value++
    await nextTick()
    await new Promise(resolve => setTimeout(resolve, 60))
    window.print()
    if (theme) root.dataset.theme = theme
    version.value++
  }
  return { keydown, reset: () => chart()?.resetZoom(), savePng, saveCsv, print }
}
