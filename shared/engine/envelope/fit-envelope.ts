import { shapeExponent, shapeExponentRate } from '../line-model/shapes'
import { DiagonalProfile } from './diagonal-profile'
import { minimiseProfile } from './minimise'
import type { ChiSquareProfile, EnvelopeProblem } from './problem'
import { SingleProfile } from './single-profile'
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
  scales: number[]
  /** Fisher covariance of (beta, scales), row-major; rows of scales at zero are zero. */
  covariance: number[]
}

/** A profile of the right kind for the problem. */
export function createProfile(problem: EnvelopeProblem): ChiSquareProfile {
  if (problem.factor) return new WhitenedProfile(problem)
  return SingleProfile.suits(problem) ? new SingleProfile(problem) : new DiagonalProfile(problem)
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
  if (allZero(profile.scales)) return 'no-positive-scale'
  if (!(profile.information > informationFloor * profile.rawInformation)) return 'no-information'
  if (edge === 'low-beta') return 'falls-to-hot-end'
  if (edge === 'high-beta') return 'falls-to-cold-end'
  return converged ? 'converged' : 'iteration-limit'
}

function allZero(values: Float64Array): boolean {
  for (let i = 0; i < values.length; i++) if (values[i] !== 0) return false
  return true
}

/** Block inverse of the Fisher matrix: var(beta) = 1/information, and each scale follows beta along its slope. */
function scalesAndCovariance(profile: ChiSquareProfile, beta: number): Pick<EnvelopeFit, 'scales' | 'covariance'> {
  const { model, bandCount } = profile.problem
  if (bandCount === 1 && model.kind === 'plain') return singleScale(profile)
  const unit = Math.exp(shapeExponent(model, beta)) / model.strengthUnit
  const rate = shapeExponentRate(model, beta)
  const variance = 1 / profile.information
  const scales: number[] = []
  const slopes: number[] = [1]
  for (let b = 0; b < bandCount; b++) {
    scales.push(profile.scales[b] * unit)
    slopes.push((profile.slopes[b] + profile.scales[b] * rate) * unit)
  }
  const covariance: number[] = []
  for (let a = 0; a <= bandCount; a++) {
    for (let b = 0; b <= bandCount; b++) {
      const fixed = a > 0 && b > 0 ? profile.scaleCovariance(a - 1, b - 1) * unit * unit : 0
      covariance.push(fixed + slopes[a] * slopes[b] * variance)
    }
  }
  return { scales, covariance }
}

/** The same for one scale and phi = e^{-e beta}, where no common factor was taken out. */
function singleScale(profile: ChiSquareProfile): Pick<EnvelopeFit, 'scales' | 'covariance'> {
  const unit = 1 / profile.problem.model.strengthUnit
  const variance = 1 / profile.information
  const slope = profile.slopes[0] * unit
  const mixed = slope * variance
  return { scales: [profile.scales[0] * unit], covariance: [variance, mixed, mixed, profile.scaleCovariance(0, 0) * unit * unit + slope * mixed] }
}
