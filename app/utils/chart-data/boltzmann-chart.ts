import type { ChartData, ChartOptions, ScriptableContext } from 'chart.js'
import type { AnnotationOptions } from 'chartjs-plugin-annotation'
import { dashes, markers, type ChartTokens } from '~/composables/useChartTokens'
import { chartOptions } from '~/utils/chart-options'
import type { BoltzmannPoint, BoltzmannSeries } from './boltzmann'
import { lineKey } from './line-key'

type IsHot = (key: string) => boolean
/** What an error-bar point carries; the ends along the energy axis are the point itself. */
type Mark = BoltzmannPoint & { xMin: number, xMax: number, yMin: number, yMax: number }
const pointOf = (context: ScriptableContext<'scatter'>) => context.raw as Mark | undefined

function pointLooks(tokens: ChartTokens, band: number, isHot: IsHot) {
  const colour = tokens.series[(band + 1) % tokens.series.length]
  const keyOf = (point: Mark | undefined) => (point ? lineKey(point) : '')
  return {
    pointStyle: (context: ScriptableContext<'scatter'>) => pointOf(context)?.atEdge ? 'triangle' : markers[band % markers.length],
    rotation: (context: ScriptableContext<'scatter'>) => pointOf(context)?.atEdge ? 180 : 0,
    radius: (context: ScriptableContext<'scatter'>) => isHot(keyOf(pointOf(context))) ? 8 : 5.5,
    hoverRadius: 8,
    borderWidth: 2,
    borderColor: (context: ScriptableContext<'scatter'>) => pointOf(context)?.used === false ? tokens.inkMuted : colour,
    backgroundColor: (context: ScriptableContext<'scatter'>) => {
      const point = pointOf(context)
      return !point || point.hollow || !point.used ? tokens.surface : colour
    },
    errorBarColor: colour, errorBarWhiskerColor: colour, errorBarLineWidth: 1.6, errorBarWhiskerLineWidth: 1.6, errorBarWhiskerSize: 6,
  }
}

/** Marks with error bars and the fitted line of every band. */
export function boltzmannChartData({ bands }: BoltzmannSeries, tokens: ChartTokens, isHot: IsHot): ChartData<'scatter'> {
  const datasets = bands.flatMap(({ band, points, fit }, index) => [
    { type: 'scatterWithErrorBars', label: band, data: points.map(point => ({ ...point, yMin: point.low, yMax: point.high })), order: 1, ...pointLooks(tokens, index, isHot) },
    { type: 'line', label: `fit ${band}`, data: fit, borderColor: tokens.series[0], borderWidth: 1.8, borderDash: dashes[index % dashes.length], pointRadius: 0, pointHitRadius: 0, order: 2 },
  ])
  // The types of the error-bar plugin want ends along x as well, where we have none.
  return { datasets } as unknown as ChartData<'scatter'>
}

function labelAnnotations(points: BoltzmannPoint[], tokens: ChartTokens, isHot: IsHot): [string, AnnotationOptions][] {
  const crowded = points.length > 24
  return points.map(point => [`label ${lineKey(point)}`, {
    type: 'label', xValue: point.x, yValue: point.y, content: point.label, position: { x: 'start', y: 'end' }, xAdjust: 8, yAdjust: -6, padding: 1,
    display: () => !crowded || isHot(lineKey(point)),
    color: () => isHot(lineKey(point)) ? tokens.ink : tokens.inkMuted,
    font: () => ({ family: '"Atkinson Mono", monospace', size: 11, weight: isHot(lineKey(point)) ? 'bold' : 'normal' }),
  }])
}

const edgeAnnotation = (edge: number, tokens: ChartTokens): AnnotationOptions => ({
  type: 'line', yMin: edge, yMax: edge, borderColor: tokens.warn, borderWidth: 1, borderDash: [3, 3],
  label: { display: true, content: 'no logarithm here: I ≤ 0, or σ reaches zero', position: 'end', backgroundColor: tokens.surface, color: tokens.inkMuted, font: { size: 11 }, yAdjust: 10, padding: 2 },
})

export function boltzmannChartOptions(series: BoltzmannSeries, tokens: ChartTokens, isHot: IsHot, onPoint: (point: BoltzmannPoint | null) => void): ChartOptions<'scatter'> {
  const base = chartOptions(tokens, { x: series.energyTitle, y: 'ln(I / w)' })
  const points = series.bands.flatMap(({ points: all }) => all)
  const edge: [string, AnnotationOptions][] = series.edge === null ? [] : [['edge', edgeAnnotation(series.edge, tokens)]]
  return {
    ...base,
    onHover: (_, elements, chart) => {
      const raw = elements.map(element => chart.data.datasets[element.datasetIndex]?.data[element.index] as unknown as BoltzmannPoint).find(point => point?.label)
      onPoint(raw ?? null)
    },
    interaction: { mode: 'nearest', intersect: true },
    scales: { x: { ...base.scales?.x, grace: '6%' } as object, y: { ...base.scales?.y, grace: '8%' } as object },
    plugins: { ...base.plugins, tooltip: { enabled: false }, annotation: { clip: false, annotations: Object.fromEntries([...edge, ...labelAnnotations(points, tokens, isHot)]) } },
  }
}
