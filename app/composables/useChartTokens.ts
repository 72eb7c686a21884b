import { tokenToRgb } from '~/utils/oklch'

export interface ChartTokens {
  surface: string
  raised: string
  ink: string
  inkMuted: string
  rule: string
  accent: string
  warn: string
  bad: string
  /** Series 1..6; take `markers` and `dashes` of the same index, so that colour is never alone. */
  series: string[]
}

export const markers = ['circle', 'rectRot', 'triangle', 'rect', 'crossRot', 'star'] as const
export const dashes = [[], [6, 4], [2, 3], [10, 3, 2, 3], [12, 4], [4, 2]]

const names = ['surface', 'surface-raised', 'ink', 'ink-muted', 'rule', 'accent', 'warn', 'bad', 'series-1', 'series-2', 'series-3', 'series-4', 'series-5', 'series-6']

function read(): ChartTokens {
  const style = getComputedStyle(document.documentElement)
  const [surface, raised, ink, inkMuted, rule, accent, warn, bad, ...series] = names.map(name => tokenToRgb(style.getPropertyValue(`--${name}`)))
  return { surface, raised, ink, inkMuted, rule, accent, warn, bad, series } as ChartTokens
}

/** Bumped when the theme on the page changed for another reason than the switch: printing. */
export const useTokenVersion = () => useState('token-version', () => 0)

/** The colours of the theme for a canvas, read again when the theme changes. For `.client.vue` components. */
export function useChartTokens(): Ref<ChartTokens> {
  const colorMode = useColorMode()
  const version = useTokenVersion()
  const tokens = shallowRef(read())
  // A canvas does not wait for its font: draw again once it is there.
  void document.fonts?.load('12px "Atkinson Mono"').then((faces) => { if (faces.length) tokens.value = read() })
  watch([() => colorMode.value, version], async () => {
    await nextTick()
    tokens.value = read()
  })
  return tokens
}
