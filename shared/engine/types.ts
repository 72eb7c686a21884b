/**
 * Words shared by every part of the engine and by those who call it.
 * Units: wavenumbers and term energies cm^-1 (vacuum), temperatures K, A in s^-1.
 * Everything here is plain data: it crosses a Web Worker or a job queue unchanged.
 */

export const observables = [
  'photon-emission',
  'energy-emission',
  'brightness-integral',
  'absorption-area',
  'optical-depth-integral',
  'equivalent-width',
  'level-population',
  'raman-scatter',
  'envelope-only',
] as const
export type Observable = (typeof observables)[number]

/** How the observable is to be read, beyond its name. A field that the observable does not need is ignored. */
export interface ObservableReading {
  observable: Observable
  /** `brightness-integral`: background temperature, K (0 allowed). */
  backgroundTemperature?: number
  /** `level-population`: is the number N_i or N_i/g_i? */
  populationPer?: 'level' | 'state'
  /** `equivalent-width`: what the width is measured in. */
  widthIn?: 'wavelength' | 'wavenumber' | 'velocity'
  /** `raman-scatter`: photons or energy. */
  signalIn?: 'photons' | 'energy'
}

/** One component (Lambda doublet, hyperfine) of a line; a single line has one. */
export interface LineComponent {
  /** Vacuum wavenumber of the transition, cm^-1. */
  wavenumber: number
  /** Term energies above the list's zero, cm^-1. */
  termUpper: number
  termLower: number
  /** Total degeneracies as the list defines them. */
  gUpper: number
  gLower: number
  /** Spontaneous emission rate, s^-1, or relative within one band. */
  einsteinA: number
  /** Pure-rotational Raman only. */
  raman?: { scatteredWavenumber: number, spinWeight: number, J: number, branch: 'stokes' | 'anti-stokes' }
}

/** A line as the model sees it: components share one measured intensity. */
export interface ModelLine {
  label: string
  /** Lines of one band share a scale. */
  band: string
  components: LineComponent[]
  /** Lines of several bands share this one area: it has no place on a Boltzmann plot and no model. */
  mixesBands?: boolean
}

/** A line with its measured intensity. `sigma` null: not known, see `NoiseKind`. */
export interface MeasuredLine extends ModelLine {
  intensity: number
  sigma: number | null
  used: boolean
  /** Why the line is not used, in words. */
  reason?: string
}

/** `absolute`: sigmas are standard uncertainties. `relative`: known up to a common factor. `from-residuals`: not known at all. */
export type NoiseKind = 'absolute' | 'relative' | 'from-residuals'

/** A closed interval; null is an open side. */
export type Interval = [low: number | null, high: number | null]

/** The other strength sets of a line list: einsteinA by [line][component], in the order of the lines given; null where the set lacks the line. */
export interface AlternativeStrengths {
  name: string
  /** Known to be incomplete: its T is shown, and is no part of the spread over the sets. */
  comparisonOnly?: boolean
  einsteinA: (number[] | null)[]
}

/** Settings of estimator 4. */
export interface TwoTemperatureSettings {
  /** Simulated data sets of the bootstrap. */
  draws: number
  /** Of their random numbers, 0 .. 2^53 - 1; stored with the result. */
  seed: number
}

/** Input of `retrieveFromLines`. */
export interface LineRetrievalInput {
  reading: ObservableReading
  lines: MeasuredLine[]
  /** Covariance of the intensities of ALL lines given, row-major n x n; when absent, diag(sigma^2). */
  covariance?: number[]
  noise: NoiseKind
  /** Search range of T, K. Default [2, 20000]. */
  temperatureRange?: [number, number]
  /** `own` (default): each band its own scale; `common`: one scale for all. */
  bandScales?: 'own' | 'common'
  strengthSet: string | null
  alternatives?: AlternativeStrengths[]
  /** Given: two temperatures are looked for as well. */
  twoTemperatures?: TwoTemperatureSettings
  /** Flags that were raised before the lines were measured (blend, saturated, shift-large, ...). */
  priorFlags?: FlagName[]
  cautions?: string[]
}

export const flagNames = [
  'few-lines', 'no-test', 'short-lever', 'weak-line', 'poor-fit', 'curved', 'tau-uncorrected', 'blend', 'saturated',
  'edge-of-range', 'open-interval', 'not-converged', 'sigma-assumed', 'line-rejected', 'q-extrapolated', 'q-truncated',
  'strength-sets-disagree', 'shift-large', 'response-stale', 'two-temperatures',
] as const
/** Stored as bits: bit i is flagNames[i]; the order is part of the database and only ever grows at the end. */
export type FlagName = (typeof flagNames)[number]

/** One line of a result. */
export interface ResultLine {
  label: string
  band: string
  /** Energy the Boltzmann plot uses (strength-weighted mean over components), cm^-1. */
  termEnergy: number
  /** Mean vacuum wavenumber, cm^-1. */
  wavenumber: number
  /** The factor w of the line model (sum over components). */
  strength: number
  intensity: number
  sigma: number | null
  /** Model intensity at the fitted temperature, null when no fit. */
  model: number | null
  /** (intensity - model) / sigma, standardised by its own expected spread; null where undefined. */
  residual: number | null
  leverage: number | null
  /** T with this line left out, K. */
  temperatureWithout: number | null
  /** Boltzmann plot ordinate ln(I / w), null for I <= 0. */
  logRatio: number | null
  sigmaLogRatio: number | null
  used: boolean
  reason?: string
}

export interface TemperatureValue {
  /** K */
  value: number
  uNoise: number
  uSystematic: number
  interval68: Interval
  interval95: Interval
  unit: 'K'
}

/** A systematic component of uncertainty, K, and what it is common to. */
export interface UncertaintyComponent {
  name: string
  kelvin: number
  commonTo: 'line' | 'band' | 'instrument' | 'campaign' | 'all'
}

/** A cross-check estimate shown beside the temperature, never instead of it. */
export interface CrossCheck {
  method: 'boltzmann-plot' | 'two-line-ratio' | 'strongest-line'
  temperature: number | null
  uncertainty: number | null
  interval: Interval | null
  note: string
}

/** The straight line of the Boltzmann plot: ln(I/w) = intercept_band - beta C2 E. */
export interface PlotLine { band: string, intercept: number, slope: number, energyRange: [number, number] }

/** One of two gases. */
export interface TwoTemperatureGas {
  /** As `TemperatureValue`; `uNoise` null where the lines do not determine it or it stands at an end of the search range. */
  temperature: { value: number, uNoise: number | null, interval68: Interval, interval95: Interval, unit: 'K' }
  scales: { band: string, value: number, uNoise: number | null }[]
  /** Its part of the modelled intensity of the used lines, 0 .. 1. */
  share: number
  plotLines: PlotLine[]
}

/** Two temperatures beside the one of the result; which of the two fits is right is not decided here. */
export interface TwoTemperatureResult {
  /** The cold and the hot one; null when there are none to show, and `reason` says why. */
  gases: [cold: TwoTemperatureGas, hot: TwoTemperatureGas] | null
  reason?: string
  chi2: number | null
  dof: number
  /** p value of chi2. */
  pValue: number | null
  /** chi2 with one temperature minus chi2 with two (`difference`), or that over chi2 with two (`ratio`: noise known up to a factor). */
  improvement: number | null
  statistic: 'difference' | 'ratio'
  /** How often data of one temperature improve as much (parametric bootstrap). */
  probability: number | null
  draws: number
  seed: number
  aicc: { one: number, two: number } | null
  /** Is the improvement more than chance explains (`twoTemperatureProbability`)? */
  preferred: boolean
  /** Modelled intensity of each used line. */
  model: number[] | null
}

/** What a retrieval gives back. `temperature` null: failed, and `reason` says why in words. No NaN anywhere. */
export interface RetrievalResult {
  temperature: TemperatureValue | null
  reason?: string
  method: 'envelope' | 'spectrum' | 'two-temperature' | 'optical-depth'
  strengthSet: string | null
  scales: { band: string, value: number, uNoise: number | null }[]
  chi2: number | null
  dof: number
  pValue: number | null
  curvatureZ: number | null
  leverArm: number | null
  /** Signal-to-noise of the weakest used line. */
  weakestSignalToNoise: number | null
  /** beta = 1/T and its Fisher standard uncertainty, 1/K. */
  beta: { value: number, uNoise: number } | null
  iterations: number
  converged: boolean
  lines: ResultLine[]
  plotLines: PlotLine[]
  crossChecks: CrossCheck[]
  /** T by band, with a chi2 of their agreement; empty for one band. */
  byBand: { band: string, temperature: number | null, uNoise: number | null }[]
  /** chi2 of the bands' 1/T about their weighted mean; absent below two bands with a temperature. */
  bandAgreement?: { chi2: number, dof: number, pValue: number }
  flags: FlagName[]
  cautions: string[]
  strengthSets: { name: string, temperature: number | null, uNoise: number | null, comparisonOnly?: boolean }[]
  components: UncertaintyComponent[]
  /** Present when two temperatures were asked for and one was found. */
  twoTemperatures?: TwoTemperatureResult
  /** Present when the lines were measured in a spectrum. */
  spectrum?: SpectrumMeasurementSummary
}

/** Spectrum input of a line measurement. Axis in vacuum cm^-1 or vacuum nm, ascending; values per axis unit or per pixel alike. */
export interface SpectrumInput {
  /** Pixel centres in vacuum nm, strictly increasing. */
  wavelength: ArrayLike<number>
  values: ArrayLike<number>
  /** Standard uncertainty per pixel, or null when not known. */
  sigma: ArrayLike<number> | null
  /** The detector's full scale in the unit of values, for `saturated`. */
  fullScale?: number
}

export interface LineProfileSettings {
  shape: 'gaussian'
  /** Full width at half maximum, nm; null: free. */
  fwhm: number | null
}

/** Input of `measureLines` (all lines at once) and of `retrieveFromSpectrum`. */
export interface SpectrumRetrievalInput {
  spectrum: SpectrumInput
  /** Lines whose area is measured; each component at its own place, weighted by its share of the line at `shareTemperature`. */
  lines: ModelLine[]
  /** Which of `lines` enter the temperature; the others are only measured (so that they do not pollute their neighbours). Default: all. */
  usedLabels?: string[]
  /** Further list lines, for the `blend` check only. */
  neighbours?: ModelLine[]
  reading: ObservableReading
  profile: LineProfileSettings
  /** Start value for a free width, nm; default: estimated from the strongest line. */
  fwhmStart?: number
  shift: 'free' | 'fixed'
  continuumOrder: number
  /** Excluded ranges, vacuum nm. */
  masks: [number, number][]
  /** What an intensity of the observable is integrated over, where it is not wavelength (default): areas are converted line by line. */
  integrateOver?: 'wavelength' | 'wavenumber' | 'frequency' | 'velocity'
  noise: NoiseKind
  temperatureRange?: [number, number]
  /** `own` (default): each band its own scale; `common`: one scale for all. */
  bandScales?: 'own' | 'common'
  strengthSet: string | null
  alternatives?: AlternativeStrengths[]
  /** Given: two temperatures are looked for as well. */
  twoTemperatures?: TwoTemperatureSettings
  cautions?: string[]
}

/** Lines measured in a spectrum: the durable intermediate. */
export interface LineMeasurementSet {
  converged: boolean
  iterations: number
  reason: string
  labels: string[]
  /** Integrated areas, value unit x nm. */
  areas: number[]
  /** Covariance of the areas, row-major. */
  covariance: number[]
  /** nm; positive: lines stand at longer wavelength than the list says. */
  shift: number
  uShift: number | null
  /** nm */
  fwhm: number
  uFwhm: number | null
  continuum: number[]
  chi2: number
  dof: number
  /** Noise per pixel when it came from the residuals, unit of values. */
  noiseFromResiduals: number | null
  /** Window of pixels that took part, [first, last]. */
  pixelRange: [number, number]
  flags: FlagName[]
}

export interface SpectrumMeasurementSummary {
  measurement: LineMeasurementSet
  /** For the picture: pixel wavelength (vacuum nm), values, model (null outside the fit), continuum. Thinned to at most 4000 points. */
  picture: { wavelength: number[], values: number[], model: (number | null)[], continuum: (number | null)[] }
}
