import { orderedFlags } from '../flags'
import type { FlagName, LineRetrievalInput, RetrievalResult } from '../types'
import { finiteOrNull } from './finite'
import type { TableFit } from './fit-table'
import { inputFlags } from './input-flags'
import { resultLines } from './result-lines'
import type { LineSelection } from './select-lines'

/** The result of a retrieval that gave no temperature. */
export function failedResult(input: LineRetrievalInput, selection: LineSelection, reason: string, fitted?: TableFit): RetrievalResult {
  return {
    temperature: null,
    reason,
    method: input.twoTemperatures ? 'two-temperature' : 'envelope',
    strengthSet: input.strengthSet,
    scales: [],
    chi2: finiteOrNull(input.noise === 'from-residuals' ? null : fitted?.fit.chi2),
    dof: Math.max(0, fitted?.dof ?? 0),
    pValue: null,
    curvatureZ: null,
    leverArm: null,
    weakestSignalToNoise: null,
    beta: null,
    iterations: fitted?.fit.iterations ?? 0,
    converged: fitted?.fit.converged ?? false,
    lines: resultLines(input, selection, null),
    plotLines: [],
    crossChecks: [],
    byBand: [],
    flags: orderedFlags([...inputFlags(input, selection), ...endFlags(fitted)]),
    cautions: input.cautions ?? [],
    strengthSets: [],
    components: [],
  }
}

function endFlags(fitted: TableFit | undefined): FlagName[] {
  const reason = fitted?.fit.reason
  if (reason === 'iteration-limit') return ['not-converged']
  return reason === 'falls-to-hot-end' || reason === 'falls-to-cold-end' ? ['edge-of-range', 'open-interval'] : []
}
