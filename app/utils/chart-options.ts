import type { ChartOptions } from 'chart.js'
import type { ChartTokens } from '~/composables/useChartTokens'

export interface AxisTitles {
  /** With the unit: "vacuum wavelength / nm". */
  x: string
  y: string
}

const axis = (tokens: ChartTokens, title: string, grid: boolean) => ({
  type: 'linear' as const,
  title: { display: true, text: title, color: tokens.inkMuted, font: { family: '"Atkinson Mono", monospace', size: 12 } },
  ticks: { color: tokens.inkMuted, font: { family: '"Atkinson Mono", monospace', size: 11 } },
  grid: { color: tokens.rule, display: grid, drawTicks: grid },
  border: { color: tokens.rule },
})

/** Axes, legend, hover and zoom as every picture has them; spread it and add to it. */
export function chartOptions(tokens: ChartTokens, titles: AxisTitles): ChartOptions<'scatter'> {
  return {
    responsive: true,
    maintainAspectRatio: false,
    animation: false,
    interaction: { mode: 'nearest', intersect: false, axis: 'xy' },
    scales: { x: axis(tokens, titles.x, false), y: axis(tokens, titles.y, true) },
    plugins: {
      legend: { display: false, labels: { color: tokens.ink, usePointStyle: true, boxHeight: 7 } },
      tooltip: {
        backgroundColor: tokens.raised, titleColor: tokens.ink, bodyColor: tokens.ink, footerColor: tokens.inkMuted,
        borderColor: tokens.rule, borderWidth: 1, padding: 10, displayColors: false, cornerRadius: 4,
      },
      zoom: {
        pan: { enabled: true, mode: 'xy', modifierKey: 'shift' },
        zoom: {
          mode: 'xy',
          wheel: { enabled: true, modifierKey: 'ctrl' },
          pinch: { enabled: true },
          drag: { enabled: true, backgroundColor: tokens.rule, borderColor: tokens.accent, borderWidth: 1, threshold: 8 },
        },
      },
    },
  }
}
