import type { EndReason } from './types'

/** End reasons in words. */
export const reasonWords: Record<EndReason, string> = {
  'offset': 'The residuals cannot be made smaller by any change of the parameters.',
  'step': 'The last step was negligible.',
  'reduction': 'The last step no longer lowered the sum of squares.',
  'rounding': 'No step lowers the sum of squares beyond rounding.',
  'exact': 'The residuals are zero.',
  'stalled': 'No step lowers the sum of squares, although its slope is not zero.',
  'undetermined': 'The data do not determine all the parameters.',
  'iteration-limit': 'No convergence within the allowed number of steps.',
  'stopped': 'The fit was stopped.',
  'invalid-input': 'The input does not make a problem.',
  'not-finite': 'The model or its derivatives are not finite there.',
}

const good: readonly EndReason[] = ['offset', 'step', 'reduction', 'rounding', 'exact']

/**
 * Did a fit end at a minimum?
 *
 * @example
 * isConverged('offset') // => true
 * isConverged('stalled') // => false
 */
export function isConverged(reason: EndReason): boolean {
  return good.includes(reason)
}
