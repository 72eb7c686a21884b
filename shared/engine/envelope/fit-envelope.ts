import { shapeExponent, shapeExponentRate } from '../line-model/shapes'
import { DiagonalProfile } from './diagonal-profile'
import { minimiseProfile } from './minimise'
import type { ChiSquareProfile, EnvelopeProblem } from './problem'
import { WhitenedProfile } from './whitened-profile'

/** Result of the envelope fit; `reason` says how it ended. */
export interface EnvelopeFit {
  converged: boolean
  reason: 'converged' | 'falls-to-hot-end' | 'falls-to-cold-end' | 'no-positive-scale' | 'no-information' | 'iteration-limit'
  iterations: number
  evaluations: number
  /** 1/T, 1/K; meaningful when converged. */
  beta: number
  chi2: number
  /** Scale per band for w and energies above the model's reference energy. */
  scales: Float64Array
  /** Fisher covariance of (beta, scales), row-major; rows of scales at zero are zero. */
  covariance: Float64Array
}

/** A profile of the right kind for the problem. */
export function createProfile(problem: EnvelopeProblem): ChiSquareProfile {
  return problem.factor ? new WhitenedProfile(problem) : new DiagonalProfile(problem)
}

/** Estimator 1: temperature and scales of smallest chi2, with their covariance. Never throws. */
export function fitEnvelope(problem: EnvelopeProblem): EnvelopeFit {
  return fitProfile(createProfile(problem))
}

/** The same from a profile that is kept, for those who go on to its intervals. The profile is left at the minimum. */
export function fitProfile(profile: ChiSquareProfile): EnvelopeFit {
  const minimum = minimiseProfile(profile)
  const reason = endReason(profile, minimum.edge, minimum.converged)
  const { beta, iterations, evaluations } = minimum
  const { scales, covariance } = scalesAndCovariance(profile, beta)
  return { converged: reason === 'converged', reason, iterations, evaluations, beta, chi2: profile.chi2, scales, covariance }
}

/** Below this share of the information with known scales, what is left is rounding: the lines share one energy. */
const informationFloor = 1e-14

function endReason(profile: ChiSquareProfile, edge: string, converged: boolean): EnvelopeFit['reason'] {
  if (profile.scales.every(scale => scale === 0)) return 'no-positive-scale'
  if (!(profile.information > informationFloor * profile.rawInformation)) return 'no-information'
  if (edge === 'low-beta') return 'falls-to-hot-end'
  if (edge === 'high-beta') return 'falls-to-cold-end'
  return converged ? 'converged' : 'iteration-limit'
}

/** Block inverse of the Fisher matrix: var(beta) = 1/information, and each scale follows beta along its slope. */
function scalesAndCovariance(profile: ChiSquareProfile, beta: number): Pick<EnvelopeFit, 'scales' | 'covariance'> {
  const { model, bandCount } = profile.problem
  const size = bandCount + 1
  const covariance = new Float64Array(size * size)
  const scales = new Float64Array(bandCount)
  const slopes = new Float64Array(bandCount)
  const unit = Math.exp(shapeExponent(model, beta)) / model.strengthUnit
  const rate = shapeExponentRate(model, beta)
  for (let b = 0; b < bandCount; b++) {
    scales[b] = profile.scales[b] * unit
    slopes[b] = (profile.slopes[b] + profile.scales[b] * rate) * unit
  }
  const fixed = profile.scaleCovariance()
  const variance = 1 / profile.information
  covariance[0] = variance
  for (let a = 0; a < bandCount; a++) {
    covariance[a + 1] = slopes[a] * variance
    covariance[(a + 1) * size] = covariance[a + 1]
    for (let b = 0; b < bandCount; b++) {
      covariance[(a + 1) * size + b + 1] = fixed[a * bandCount + b] * unit * unit + slopes[a] * slopes[b] * variance
    }
  }
  return { scales, covariance }
}
