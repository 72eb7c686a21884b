import type { ChartData, ChartOptions } from 'chart.js'
import type { ChartTokens } from '~/composables/useChartTokens'
import { chartOptions } from '~/utils/chart-options'
import { superscript } from './power'
import type { SpectrumSeries } from './spectrum'

/** Observed, model and continuum above; observed minus model in a strip below, on the same wavelengths. */
export function spectrumChartData({ data, model, continuum, residual }: SpectrumSeries, tokens: ChartTokens): ChartData<'line', { x: number, y: number | null }[]> {
  const strip = residual.some(point => point.y !== null)
  const line = { pointRadius: 0, pointHitRadius: 0, spanGaps: false, tension: 0, fill: false }
  return {
    datasets: [
      { ...line, label: 'model', data: model, borderColor: tokens.series[0], borderWidth: 1.8, yAxisID: 'y', order: 1 },
      { ...line, label: 'observed', data, borderColor: tokens.inkMuted, borderWidth: 1, yAxisID: 'y', order: 2 },
      { ...line, label: 'continuum', data: continuum, borderColor: tokens.series[2], borderWidth: 1, borderDash: [4, 3], yAxisID: 'y', order: 3 },
      ...(strip ? [{ ...line, label: 'observed − model', data: residual, borderColor: tokens.series[1], borderWidth: 1, yAxisID: 'residual', order: 4 }] : []),
    ],
  }
}

export interface SpectrumChartWords { range: [number, number] | null, axisTitle: string, valueTitle: string, /** A strip of residuals below. */ strip: boolean, /** Power of ten taken out of the values. */ power: number }

export function spectrumChartOptions(tokens: ChartTokens, { range, axisTitle, valueTitle, strip, power }: SpectrumChartWords, onPoint: (x: number) => void): ChartOptions<'line'> {
  const base = chartOptions(tokens, { x: axisTitle, y: power ? `${valueTitle} × 10${superscript(-power)}` : valueTitle }) as ChartOptions<'line'>
  const divisor = 10 ** power
  const scale = { ...base.scales?.y, ticks: { ...base.scales?.y?.ticks, callback: (value: number | string) => String(Number((Number(value) / divisor).toPrecision(6))) } }
  const plainTicks = { ...base.scales?.x?.ticks, includeBounds: false, format: { useGrouping: false } }
  // The lowest tick would touch the highest of the strip below.
  const above = { ...scale.ticks, callback: (value: number | string, index: number) => (strip && index === 0 ? '' : scale.ticks.callback(value)) }
  // Its name begins with r, which would make it a radial axis if nothing else were said.
  const residual = { ...scale, axis: 'y' as const, position: 'left' as const, stack: 'spectrum', stackWeight: 1, weight: 0, title: { display: true, color: tokens.inkMuted, font: { family: '"Atkinson Mono", monospace', size: 12 }, text: 'residual' }, ticks: { ...scale?.ticks, maxTicksLimit: 3 } }
  return {
    ...base,
    parsing: false,
    normalized: true,
    onHover: (event, _, chart) => {
      const x = event.x === null ? undefined : chart.scales.x?.getValueForPixel(event.x)
      if (x !== undefined) onPoint(x)
    },
    scales: {
      x: { ...base.scales?.x, ticks: plainTicks, ...(range ? { min: range[0], max: range[1] } : {}) } as object,
      y: { ...scale, ticks: above, axis: 'y' as const, position: 'left' as const, stack: 'spectrum', stackWeight: 4, weight: 1, grace: '14%' } as object,
      ...(strip ? { residual: residual as object } : {}),
    },
    plugins: { ...base.plugins, tooltip: { enabled: false }, zoom: { ...base.plugins?.zoom, pan: { ...base.plugins?.zoom?.pan, mode: 'x' }, zoom: { ...base.plugins?.zoom?.zoom, mode: 'x' } } },
  }
}
