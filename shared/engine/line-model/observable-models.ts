import type { Observable } from '../types'
import { absorptionArea, equivalentWidth, opticalDepthIntegral } from './absorption'
import { brightnessIntegral } from './brightness'
import type { ObservableModel } from './component-model'
import { energyEmission, photonEmission } from './emission'
import { envelopeOnly } from './envelope-only'
import { levelPopulation } from './population'
import { ramanScatter } from './raman'

/** The line model of every observable. */
export const observableModels: Record<Observable, ObservableModel> = {
  'photon-emission': photonEmission,
  'energy-emission': energyEmission,
  'brightness-integral': brightnessIntegral,
  'absorption-area': absorptionArea,
  'optical-depth-integral': opticalDepthIntegral,
  'equivalent-width': equivalentWidth,
  'level-population': levelPopulation,
  'raman-scatter': ramanScatter,
  'envelope-only': envelopeOnly,
}
