import type { ModelLine, SpectrumInput, SpectrumRetrievalInput } from '../../engine/types'
import { isFrequencyUnit } from '../../engine/units/axis'
import type { RetrievalSettings } from '../../schemas/settings'
import type { LineList } from '../../types/line-list'
import type { SpectrumAbout } from '../../types/spectrum'
import { cautionsFor } from './cautions'
import { choiceFailed, chosenLines } from './chosen-lines'
import type { ChosenLine } from './list-lines'
import { alternativeSets, chooseStrengthSet, modelLine, strengthsOf } from './list-lines'
import { linesBeside } from './nuisance'
import type { InputProblem, Prepared } from './problem'
import { readingOf, readingProblems } from './reading'

/** A spectrum on rising vacuum nm with what is known of it. */
export interface PreparedSpectrum {
  wavelength: ArrayLike<number>
  values: ArrayLike<number>
  sigma: ArrayLike<number> | null
  about: Partial<SpectrumAbout>
}

interface Source { spectrum: PreparedSpectrum, settings: RetrievalSettings, lineList: LineList | null }

const emission = new Set(['photon-emission', 'energy-emission'])

/** Photons or energy: stated by the spectrum; the settings must not say otherwise. */
function valueKindProblems({ spectrum: { about }, settings: { observable } }: Source): InputProblem[] {
  if (!emission.has(observable)) return []
  if (!about.valueKind) return [{ path: 'valueKind', message: 'State whether the values of the spectrum count photons or energy: the temperature differs by about 2 K.' }]
  const expected = observable === 'photon-emission' ? 'photons' : 'energy'
  if (about.valueKind === expected) return []
  return [{ path: 'observable', message: `The spectrum's values count ${about.valueKind}, the settings read ${observable}: change one of them.` }]
}

function settingsProblems({ settings, lineList }: Source): InputProblem[] {
  if (settings.observable === 'level-population') return [{ path: 'observable', message: 'Level populations are not read from a spectrum: submit them as a line table.' }]
  if (settings.observable === 'raman-scatter') return [{ path: 'observable', message: 'No built-in line list holds Raman lines: submit their intensities as a line table.' }]
  if (lineList === null && settings.lineList === null) return [{ path: 'lineList', message: 'A spectrum needs a line list that says where the lines stand.' }]
  if (lineList === null) return [{ path: 'lineList', message: `There is no line list "${settings.lineList}".` }]
  return []
}

/** What the observable is integrated over; emission follows the axis of the file, whose densities are per unit of that axis. */
function integrationAxis({ spectrum: { about }, settings }: Source): SpectrumRetrievalInput['integrateOver'] {
  switch (settings.observable) {
    case 'absorption-area': return 'wavenumber'
    case 'optical-depth-integral':
    case 'brightness-integral': return 'velocity'
    case 'equivalent-width': return settings.widthIn ?? 'wavelength'
    default: return isFrequencyUnit(about.axisUnit ?? null) ? (about.axisUnit === 'cm-1' ? 'wavenumber' : 'frequency') : 'wavelength'
  }
}

/** Lines of the whole list within the spectrum, or, without overlap, none. */
function beside(list: LineList, chosen: ChosenLine[], { wavelength }: PreparedSpectrum, set: string) {
  return linesBeside(list, chosen, [wavelength[0], wavelength[wavelength.length - 1]], set)
}

/** Strengths of lines outside the chosen ones may come from another set: they only help to see them coming. */
function neighbourLine(list: LineList, line: ChosenLine, set: string): ModelLine[] {
  const name = [set, ...list.strengthSets.map(one => one.name)].find(one => strengthsOf(line.line, one) !== null)
  return name === undefined ? [] : [modelLine(line, name)]
}

function spectrumInput({ wavelength, values, sigma, about }: PreparedSpectrum): SpectrumInput {
  return { wavelength, values, sigma, ...(about.fullScale ? { fullScale: about.fullScale } : {}) }
}

function build(source: Source, list: LineList, chosen: ChosenLine[], set: string): SpectrumRetrievalInput {
  const { spectrum, settings } = source
  const { nuisance, faint } = beside(list, chosen, spectrum, set)
  const nuisanceLines = nuisance.flatMap(line => neighbourLine(list, line, set))
  const bands = settings.bandScales === 'common' ? 1 : new Set(chosen.map(({ band }) => band.id)).size
  return {
    spectrum: spectrumInput(spectrum),
    lines: [...chosen.map(line => modelLine(line, set)), ...nuisanceLines],
    usedLabels: chosen.map(({ label }) => label),
    neighbours: faint.flatMap(line => neighbourLine(list, line, set)),
    reading: readingOf(settings),
    profile: settings.profile,
    shift: settings.shift,
    continuumOrder: settings.continuumOrder,
    masks: settings.masks,
    integrateOver: integrationAxis(source),
    noise: settings.noise,
    temperatureRange: settings.temperatureRange,
    bandScales: settings.bandScales,
    strengthSet: set,
    alternatives: alternativeSets(list, chosen, set).map(other => ({
      ...other,
      einsteinA: [...chosen.map(({ line }) => strengthsOf(line, other.name)), ...nuisanceLines.map(() => null)],
    })),
    cautions: cautionsFor(list, chosen, set, chosen.length, bands),
  }
}

/**
 * The engine's input from a spectrum: the chosen lines, those of the whole list that may be seen beside them, and the fainter ones for
 * the blend check. The settings' observable must agree with what the values count.
 */
export function prepareFromSpectrum(source: Source): Prepared<SpectrumRetrievalInput> {
  const { settings, lineList } = source
  const problem = [...settingsProblems(source), ...valueKindProblems(source), ...readingProblems(readingOf(settings))]
  if (problem.length > 0 || lineList === null) return { problem }
  const chosen = chosenLines(lineList, settings)
  if (choiceFailed(chosen)) return { problem: chosen }
  const choice = chooseStrengthSet(lineList, chosen, settings.strengthSet)
  if ('message' in choice) return { problem: [{ path: 'strengthSet', message: choice.message }] }
  return { input: build(source, lineList, chosen, choice.set) }
}
