/** Every limit at which a flag is raised or a default applies, in one place. */

/** `few-lines`: fewer used lines than this. */
export const fewLines = 3
/** `short-lever`: C2 (E_max - E_min) / T below this. */
export const shortLever = 1
/** `weak-line`: signal-to-noise of the weakest used line below this: the log fit of the Boltzmann plot is biased there. */
export const weakLineSignalToNoise = 20
/** `poor-fit`: p value of chi2 below this. */
export const poorFitProbability = 1e-3
/** `curved`: |z| of the quadratic term in E above this. */
export const curvedZ = 3
/** Curvature needs at least this many used lines. */
export const curvatureLines = 4
/** `edge-of-range`: T within this fraction of an end of the search range. */
export const edgeFraction = 0.01
/** Search range of T when none is given, K. */
export const defaultTemperatureRange: [number, number] = [2, 20000]
/** Lines with I <= this many sigma stay out of the Boltzmann plot's straight line. */
export const hollowSigmas = 3
/** `blend`: a list line outside the model within this many FWHM ... */
export const blendWidths = 1
/** ... that would add more than this fraction of the line. */
export const blendFraction = 0.02
/** `saturated`: this many equal maxima in a line. */
export const saturatedEqualMaxima = 3
/** `shift-large`: |shift| above this many FWHM. */
export const largeShiftWidths = 0.5
/** `strength-sets-disagree`: largest change of T between sets above this many u_noise. */
export const strengthSetNoise = 1
/** `tau-uncorrected`: largest line-centre optical depth above this without correction. */
export const uncorrectedTau = 0.3
/** `q-truncated`: a direct sum that misses more than this fraction of Q. */
export const truncatedPartition = 0.01
/** Up to this many used lines each is left out by a full fit; above, by one linearised step. */
export const leaveOneOutExactLines = 64
/** Two temperatures are tried with at least this many used lines. */
export const twoTemperatureLines = 6
/** `two-temperatures`: the improvement is this unlikely, or less, when there is one temperature. */
export const twoTemperatureProbability = 0.01
