import { observables } from '../types'
import type { ObservableReading } from '../types'
import { observableModels } from './observable-models'

/** What the reading of an observable lacks, in words; null when it is complete. Nothing is assumed. */
export function missingReading(reading: ObservableReading): string | null {
  if (!observables.includes(reading.observable)) return 'The observable is not one of the known ones.'
  return observableModels[reading.observable].missing(reading)
}
