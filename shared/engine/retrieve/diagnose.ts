import { boltzmannPlotCheck } from '../boltzmann-plot/cross-check'
import { strongestLineCheck } from '../cross-checks/strongest-line'
import { twoLineCheck } from '../cross-checks/two-line-check'
import { bandAgreement, temperatureByBand } from '../diagnostics/bands'
import { curvatureZ } from '../diagnostics/curvature'
import { leaveOneOut } from '../diagnostics/leave-one-out'
import type { LeftOut } from '../diagnostics/leave-one-out'
import { lineSelection } from '../diagnostics/line-selection'
import { lineResiduals } from '../diagnostics/residuals'
import { leverArm, weakestSignalToNoise } from '../diagnostics/signal'
import { strengthSetComponent, strengthSetTemperatures } from '../diagnostics/strength-sets'
import { whitenFit } from '../diagnostics/whitened-fit'
import type { WhitenedFit } from '../diagnostics/whitened-fit'
import type { CrossCheck, LineRetrievalInput, RetrievalResult } from '../types'
import { finiteOrNull } from './finite'
import type { TableFit } from './fit-table'
import type { FittedModel } from './result-lines'
import type { LineSelection } from './select-lines'

type Diagnosis = Pick<RetrievalResult, 'curvatureZ' | 'leverArm' | 'weakestSignalToNoise' | 'crossChecks' | 'byBand' | 'bandAgreement' | 'strengthSets' | 'components'>

/** All that section 5 of a result says beyond the fit itself, and the diagnostics of its lines. */
export function diagnose(input: LineRetrievalInput, selection: LineSelection, fitted: TableFit): { diagnosis: Diagnosis, model: FittedModel } {
  const white = whitenFit(fitted)
  const without = leaveOneOut(fitted, white)
  const strengthSets = strengthSetTemperatures(fitted, input.strengthSet ?? 'as given', input.alternatives ?? [], selection.used)
  const byBand = temperatureByBand(fitted)
  const components = [strengthSetComponent(strengthSets), lineSelection(fitted, without)].filter(component => component !== null)
  const agreement = bandAgreement(byBand)
  const diagnosis: Diagnosis = {
    curvatureZ: finiteOrNull(curvatureZ(fitted, white)),
    leverArm: finiteOrNull(leverArm(fitted)),
    weakestSignalToNoise: finiteOrNull(weakestSignalToNoise(fitted)),
    crossChecks: crossChecks(fitted),
    byBand,
    ...(agreement ? { bandAgreement: agreement } : {}),
    strengthSets,
    components,
  }
  return { diagnosis, model: fittedModel(fitted, selection, white, without) }
}

function crossChecks(fitted: TableFit): CrossCheck[] {
  return [boltzmannPlotCheck(fitted), twoLineCheck(fitted), strongestLineCheck(fitted)]
    .filter(check => check !== null)
    .map(check => ({ ...check, temperature: finiteOrNull(check.temperature), uncertainty: finiteOrNull(check.uncertainty) }))
}

function fittedModel(fitted: TableFit, selection: LineSelection, white: WhitenedFit, without: (LeftOut | null)[]): FittedModel {
  const { fit, bands, table, varianceFactor, profile } = fitted
  const residuals = lineResiduals(fitted, white)
  return {
    beta: fit.beta,
    referenceEnergy: profile.problem.model.referenceEnergy,
    scaleOf: band => fit.scales[table.bandScales === 'common' ? 0 : bands.indexOf(band)],
    diagnostics: new Map(selection.used.map((index, i) => [index, {
      residual: finiteOrNull(residuals[i].residual),
      leverage: finiteOrNull(residuals[i].leverage),
      temperatureWithout: finiteOrNull(without[i] && 1 / without[i].beta),
    }])),
    sigma: varianceFactor === null ? null : table.sigma[0] * Math.sqrt(varianceFactor),
  }
}
