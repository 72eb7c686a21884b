import type { AlternativeStrengths, LineRetrievalInput, MeasuredLine, NoiseKind, ObservableReading } from '../../engine/types'
import type { LineTable, TableLine } from '../../schemas/line-table'
import type { RetrievalSettings } from '../../schemas/settings'
import type { LineList } from '../../types/line-list'
import { cautionsFor } from './cautions'
import type { ChosenLine } from './list-lines'
import { alternativeSets, chooseStrengthSet, findLine, modelLine, strengthsOf } from './list-lines'
import { componentOf, molecularProblems } from './molecular-data'
import { nearLabels } from './near-labels'
import type { InputProblem, Prepared } from './problem'
import { readingProblems, tableReading } from './reading'

interface Source { table: LineTable, settings: RetrievalSettings, lineList: LineList | null }

const isInline = (line: TableLine) => ['termUpper', 'termLower', 'gUpper', 'A', 'wavenumber', 'scatteredWavenumber'].some(key => line[key as keyof TableLine] !== undefined)

/** The band a table line belongs to: its own, the table's, or the settings' only one; a band in the label counts too. */
function bandOf(line: TableLine, { table, settings, lineList }: Source): string | undefined {
  const stated = line.band ?? table.band ?? (settings.bands.length === 1 ? settings.bands[0] : undefined)
  if (stated !== undefined) return stated
  const named = lineList?.bands.find(band => line.label.startsWith(`${band.id} `))
  return named?.id ?? (lineList?.bands.length === 1 ? lineList.bands[0].id : undefined)
}

function lookUp(line: TableLine, i: number, source: Source & { lineList: LineList }): ChosenLine | InputProblem {
  const { lineList } = source
  const wanted = bandOf(line, source)
  const known = lineList.bands.map(({ id }) => id)
  if (wanted === undefined) return { path: `lines.${i}.band`, message: `${line.label}: state the band; ${lineList.id} has ${known.join(', ')}.` }
  const band = lineList.bands.find(({ id }) => id === wanted)
  if (!band) return { path: line.band === undefined ? 'band' : `lines.${i}.band`, message: `The line list ${lineList.id} has no band "${wanted}"; near: ${nearLabels(wanted, known).join(', ')}.` }
  const found = findLine(band, line.label)
  if (!found) {
    const near = nearLabels(line.label, band.lines.map(({ label }) => label))
    return { path: `lines.${i}.label`, message: `The band ${band.id} of ${lineList.id} has no line "${line.label}"; near: ${near.join(', ')}.` }
  }
  return { band, line: found, label: line.label }
}

const isProblem = (found: ChosenLine | InputProblem): found is InputProblem => 'path' in found

/** With no sigma at all the noise comes from the residuals; some with and some without is a problem. */
function noiseOf(table: LineTable, settings: RetrievalSettings): NoiseKind | InputProblem[] {
  if (settings.noise === 'from-residuals') return 'from-residuals'
  const lacking = table.lines.flatMap((line, i) => line.sigma === undefined || line.sigma === null ? [i] : [])
  if (lacking.length === table.lines.length) return 'from-residuals'
  if (lacking.length === 0) return settings.noise
  return lacking.map(i => ({ path: `lines.${i}.sigma`, message: `${table.lines[i].label} has no sigma while other lines have one: give all or none.` }))
}

const measured = (line: TableLine) => ({ intensity: line.intensity, sigma: line.sigma ?? null, used: true })

/** Chosen lines of a table; the settings' labels, when there are any, narrow it. */
function isUsed(line: TableLine, { settings }: Source): boolean {
  return settings.lines.length === 0 || settings.lines.includes(line.label)
}

function common(source: Source, reading: ObservableReading, noise: NoiseKind, lines: MeasuredLine[], set: string | null, chosen: ChosenLine[], alternatives: AlternativeStrengths[]): LineRetrievalInput {
  const used = lines.filter(line => line.used)
  const bands = source.settings.bandScales === 'common' ? 1 : new Set(used.map(line => line.band)).size
  return {
    reading,
    lines,
    noise,
    temperatureRange: source.settings.temperatureRange,
    bandScales: source.settings.bandScales,
    strengthSet: set,
    alternatives,
    cautions: cautionsFor(source.lineList, chosen, set, used.length, bands),
  }
}

function inlineInput(source: Source, reading: ObservableReading, noise: NoiseKind): Prepared<LineRetrievalInput> {
  const { table } = source
  const problem = table.lines.flatMap((line, i) => molecularProblems(line, reading, i))
  if (problem.length > 0) return { problem }
  const lines = table.lines.map(line => ({ label: line.label, band: line.band ?? table.band ?? '', components: [componentOf(line)], ...measured(line), used: isUsed(line, source) }))
  return { input: common({ ...source, lineList: null }, reading, noise, lines, null, [], []) }
}

function listInput(source: Source & { lineList: LineList }, reading: ObservableReading, noise: NoiseKind): Prepared<LineRetrievalInput> {
  const { table, settings, lineList } = source
  const found = table.lines.map((line, i) => lookUp(line, i, source))
  const problem = found.filter(isProblem)
  if (problem.length > 0) return { problem }
  const chosen = found as ChosenLine[]
  const choice = chooseStrengthSet(lineList, chosen, table.strengthSet ?? settings.strengthSet)
  if ('message' in choice) return { problem: [{ path: 'strengthSet', message: choice.message }] }
  const lines = chosen.map((line, i) => ({ ...modelLine(line, choice.set), ...measured(table.lines[i]), used: isUsed(table.lines[i], source) }))
  const alternatives = alternativeSets(lineList, chosen, choice.set).map(other => ({ ...other, einsteinA: chosen.map(({ line }) => strengthsOf(line, other.name)) }))
  return { input: common(source, reading, noise, lines, choice.set, chosen, alternatives) }
}

/**
 * The engine's input from a line table: lines by label from a line list, or with their molecular data in line.
 * Problems name the path in the table, e.g. `lines.3.label`.
 */
export function prepareFromTable(source: Source): Prepared<LineRetrievalInput> {
  const { table, settings, lineList } = source
  const reading = tableReading(table, settings)
  const noise = noiseOf(table, settings)
  const problem = [...readingProblems(reading), ...(Array.isArray(noise) ? noise : [])]
  const asked = table.lineList ?? settings.lineList
  const inline = table.lines.every(isInline)
  if (asked && !lineList && !inline) problem.push({ path: 'lineList', message: `There is no line list "${asked}".` })
  if (problem.length > 0 || Array.isArray(noise)) return { problem }
  return lineList && !inline ? listInput({ ...source, lineList }, reading, noise) : inlineInput(source, reading, noise)
}
