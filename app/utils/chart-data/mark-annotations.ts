import type { AnnotationOptions } from 'chartjs-plugin-annotation'
import type { Chart } from 'chart.js'
import type { ChartTokens } from '~/composables/useChartTokens'
import { lineKey } from './line-key'
import type { LineMark } from './line-marks'

const top = (chart: Chart) => chart.scales.y?.max ?? 1
const bottom = (chart: Chart) => chart.scales.y?.min ?? 0

/** Strokes that hang from the upper edge at each line, with its label; the line under the pointer reaches down. */
export function markAnnotations(marks: LineMark[], tokens: ChartTokens, isHot: (key: string) => boolean): Record<string, AnnotationOptions> {
  const entries = marks.flatMap((mark): [string, AnnotationOptions][] => {
    const key = lineKey(mark)
    const colour = mark.used ? tokens.accent : tokens.inkMuted
    return [
      [`stroke ${key}`, {
        type: 'line', xScaleID: 'x', yScaleID: 'y', xMin: mark.x, xMax: mark.x,
        yMax: ({ chart }) => top(chart),
        yMin: ({ chart }) => isHot(key) ? bottom(chart) : top(chart) - 0.045 * (top(chart) - bottom(chart)),
        borderColor: colour, borderWidth: () => isHot(key) ? 1.5 : 2, borderDash: mark.used ? [] : [2, 2],
      }],
      [`label ${key}`, {
        type: 'label', xScaleID: 'x', yScaleID: 'y', xValue: mark.x, yValue: ({ chart }) => top(chart),
        content: mark.used ? mark.label : `${mark.label} off`, position: { x: 'start', y: 'start' }, xAdjust: 2, yAdjust: 4 + 14 * mark.row,
        padding: 1, color: () => isHot(key) ? tokens.ink : tokens.inkMuted,
        font: () => ({ family: '"Atkinson Mono", monospace', size: 11, weight: isHot(key) ? 'bold' : 'normal' }),
      }],
    ]
  })
  return Object.fromEntries(entries)
}
