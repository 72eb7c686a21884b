import { dotProduct, norm, removeComponents } from '../linalg/orthonormalise'
import { lineStrength } from '../line-model/line-strength'
import type { TableFit } from '../retrieve/fit-table'
import { curvatureLines } from '../thresholds'
import type { WhitenedFit } from './whitened-fit'

/** Below this share of its length the quadratic column is spanned by temperature and scales. */
const independenceFloor = 1e-6

/**
 * z of a quadratic term in E inside the intensity model, m_i exp(q (E_i - E_mean)^2), at q = 0 (score test, Rao 1948).
 * Standard normal for one temperature and known noise; with relative noise in units of the residuals' spread without that term.
 *
 * @returns null below four lines, or when the lines leave the term undetermined
 */
export function curvatureZ({ table, dof, fit }: TableFit, white: WhitenedFit): number | null {
  if (table.lines.length < curvatureLines || dof < 1) return null
  const energies = table.lines.map(line => lineStrength(line, table.reading).termEnergy)
  const mean = energies.reduce((a, b) => a + b, 0) / energies.length
  const reach = energies.reduce((a, e) => Math.max(a, Math.abs(e - mean)), 0) || 1
  const column = white.whiten(white.model.map((m, i) => m * ((energies[i] - mean) / reach) ** 2))
  const rest = removeComponents(column, white.basis)
  const length = norm(rest)
  if (!(length > independenceFloor * norm(column))) return null
  const z = dotProduct(rest, white.residuals) / length
  if (table.noise === 'absolute') return z
  const spread = (fit.chi2 - z * z) / (dof - 1)
  return dof > 1 && spread > 0 ? z / Math.sqrt(spread) : null
}
