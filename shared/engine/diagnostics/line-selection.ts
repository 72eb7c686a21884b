import type { TableFit } from '../retrieve/fit-table'
import type { UncertaintyComponent } from '../types'
import type { LeftOut } from './leave-one-out'

/**
 * Systematic part from the choice of lines: what leaving out a line moves beyond the noise.
 * In beta: mean over lines of (beta_without - beta)^2 - (u_without^2 - u^2), the second bracket being the variance
 * that noise alone gives that difference (Hausman 1978); zero when negative; its root times T^2 is the component, K.
 *
 * @returns null when fewer than three lines could be left out
 */
export function lineSelection({ fit, uBeta }: TableFit, without: readonly (LeftOut | null)[]): UncertaintyComponent | null {
  if (uBeta === null) return null
  let sum = 0
  let count = 0
  for (const other of without) {
    if (!other || other.uBeta === null) continue
    sum += (other.beta - fit.beta) ** 2 - Math.max(0, other.uBeta ** 2 - uBeta ** 2)
    count++
  }
  if (count < 3) return null
  const kelvin = Math.sqrt(Math.max(0, sum / count)) / fit.beta ** 2
  return Number.isFinite(kelvin) ? { name: 'line selection', kelvin, commonTo: 'line' } : null
}
