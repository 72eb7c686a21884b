import {
  CategoryScale, Chart, Filler, Legend, LinearScale, LineController, LineElement, LogarithmicScale, PointElement, ScatterController, Tooltip,
} from 'chart.js'
import { PointWithErrorBar, ScatterWithErrorBarsController } from 'chartjs-chart-error-bars'
import annotation from 'chartjs-plugin-annotation'
import zoom from 'chartjs-plugin-zoom'

let ready = false

/** Registers what our pictures use. Called by every `.client.vue` chart. */
export function setUpCharts(): void {
  if (ready) return
  ready = true
  Chart.register(
    CategoryScale, LinearScale, LogarithmicScale, PointElement, LineElement, LineController, ScatterController, Legend, Tooltip, Filler,
    ScatterWithErrorBarsController, PointWithErrorBar, annotation, zoom,
  )
  Chart.defaults.font.family = '"Atkinson Next", system-ui, sans-serif'
  Chart.defaults.font.size = 12
  if (window.matchMedia('(prefers-reduced-motion: reduce)').matches) Chart.defaults.animation = false
}
