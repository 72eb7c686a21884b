import type { ModelLine, SpectrumRetrievalInput } from '../types'
import type { WeightedLine } from './start-shift'
import { groupLines } from './grouping'
import { legendreBasis } from './legendre'
import { LineColumns } from './columns'
import { LinearSystem } from './linear-system'
import type { FitPixels } from './pixels'
import { pixelsWithin } from './pixels'
import type { RejectedLine } from './placing'
import { bandZeros, componentShares, componentWavelength, lineExtent, lineWeight, lowestEnergy, shareTemperature } from './shares'

/** A line narrower than this many pixels is integrated over them. */
export const integratedBelow = 2
/** The fit takes the lines' extent and this many FWHM to either side. */
const margin = 10

/** Everything that is fixed while shift and width are sought. */
export interface FitProblem {
  lines: ModelLine[]
  used: boolean[]
  weighted: WeightedLine[]
  pixels: FitPixels
  system: LinearSystem
  rejected: RejectedLine[]
  /** Bounds of the continuum's argument, nm. */
  window: [number, number]
}

/** Window around lines, nm: their extent with ten FWHM (at least ten pixels) to either side. */
export function fitWindow(lines: readonly ModelLine[], fwhm: number, pixel: number): [number, number] {
  const extents = lines.map(lineExtent)
  const side = margin * Math.max(fwhm, pixel)
  return [Math.min(...extents.map(([low]) => low)) - side, Math.max(...extents.map(([, high]) => high)) + side]
}

function weightedLines(lines: readonly ModelLine[], input: SpectrumRetrievalInput): WeightedLine[] {
  const { reading, temperatureRange: [low, high] = [2, 20000] } = input
  const temperature = Math.min(high, Math.max(low, shareTemperature))
  const ownZeros = bandZeros(input.lines, reading)
  const zeros = new Map<string, number>()
  for (const { band } of lines) if (!zeros.has(band)) zeros.set(band, lowestEnergy(lines.filter(line => line.band === band), reading))
  return lines.map((line) => {
    const shares = componentShares(line, reading, temperature, ownZeros)
    const components = line.components.map((component, c) => ({ wavelength: componentWavelength(component), share: shares[c] }))
    return { components, weight: lineWeight(line, reading, temperature, zeros.get(line.band) ?? 0) }
  })
}

/** Scales each band's weights to a largest of 1: bands cannot be compared before they are measured. */
function levelBands(lines: readonly ModelLine[], weighted: WeightedLine[]): void {
  const largest = new Map<string, number>()
  lines.forEach(({ band }, i) => largest.set(band, Math.max(largest.get(band) ?? 0, weighted[i].weight)))
  lines.forEach(({ band }, i) => {
    weighted[i].weight /= largest.get(band) || 1
  })
}

/** Part of each line's area that usable pixels see, with the columns as they stand. */
function coverage(columns: LineColumns): number[] {
  const { pixels: { width, weight }, start, end, offset, value } = columns
  return columns.lines.map((_, i) => {
    let sum = 0
    for (let p = start[i], k = offset[i]; p < end[i]; p++, k++) sum += value[k] / weight[p] * width[p]
    return sum
  })
}

function systemFor(pixels: FitPixels, weighted: WeightedLine[], window: [number, number], order: number, integrated: boolean): LinearSystem {
  const basis = legendreBasis(pixels.wavelength, window[0], window[1], order)
  return new LinearSystem(pixels, new LineColumns(pixels, weighted, integrated), basis.map(vector => vector.map((value, p) => value * pixels.weight[p])))
}

/** The same problem with the profile integrated over the pixels. */
export function integratedProblem(problem: FitProblem, order: number): FitProblem {
  return { ...problem, system: systemFor(problem.pixels, problem.weighted, problem.window, order, true) }
}

/**
 * Lays out the fit for an expected width: pixels, lines (used ones and those around them), shares, continuum.
 * Lines of which usable pixels see less than half are set aside.
 */
export function layOutProblem(input: SpectrumRetrievalInput, used: ModelLine[], others: ModelLine[], fwhm: number, pixel: number): FitProblem {
  const window = fitWindow(used, fwhm, pixel)
  const pixels = pixelsWithin(input.spectrum, window[0], window[1], input.masks)
  const near = others.filter((line) => {
    const [low, high] = lineExtent(line)
    return low >= window[0] && high <= window[1]
  })
  const lines = groupLines(used, near, fwhm)
  const weighted = weightedLines(lines, input)
  const columns = new LineColumns(pixels, weighted, fwhm < integratedBelow * pixel)
  columns.fill(0, fwhm)
  const seen = coverage(columns).map(part => part >= 0.5)
  const kept = lines.filter((_, i) => seen[i])
  const keptWeighted = weighted.filter((_, i) => seen[i])
  levelBands(kept, keptWeighted)
  const rejected = lines.filter((line, i) => !seen[i] && used.includes(line))
    .map(line => ({ line, reason: 'most of its pixels are masked, missing or beyond the end of the spectrum' }))
  const isUsed = new Set(used)
  return {
    lines: kept,
    used: kept.map(line => isUsed.has(line)),
    weighted: keptWeighted,
    pixels,
    system: systemFor(pixels, keptWeighted, window, input.continuumOrder, columns.integrated),
    rejected,
    window,
  }
}

/** The problem of a fit that was made: these lines (one area each) over all usable pixels of the window, nm. */
export function restoreProblem(input: SpectrumRetrievalInput, lines: ModelLine[], window: [number, number], integrated: boolean): FitProblem {
  const pixels = pixelsWithin(input.spectrum, window[0], window[1], input.masks)
  const weighted = weightedLines(lines, input)
  return { lines, used: lines.map(() => true), weighted, pixels, system: systemFor(pixels, weighted, window, input.continuumOrder, integrated), rejected: [], window }
}
