import { symmetricInverseFromCholesky } from '../linalg/cholesky-solve'
import type { FitOutcome } from './fit'
import type { LinearSystem } from './linear-system'

/**
 * Covariance of the linear parameters with shift and width marginalised: A^-1 + Z S^-1 Z^T, row-major over all linear parameters.
 * The system must stand at the outcome's point and the outcome's derivatives be taken there.
 */
export function linearCovariance(system: LinearSystem, outcome: FitOutcome): Float64Array {
  const covariance = symmetricInverseFromCholesky(system.factor, system.size)
  if (!outcome.nonlinear) return covariance
  const [z0, z1] = outcome.nonlinear.response
  const [a, b, d] = outcome.inverse
  for (let i = 0; i < system.size; i++) {
    for (let j = 0; j < system.size; j++) {
      covariance[i * system.size + j] += z0[i] * (a * z0[j] + b * z1[j]) + z1[i] * (b * z0[j] + d * z1[j])
    }
  }
  return covariance
}
