import type { LineRetrievalInput, MeasuredLine, ResultLine } from '#shared/engine/types'
import type { RetrievalDetail } from '#shared/types/retrieval'
import type { LineList } from '#shared/types/line-list'
import { prepareFromTable } from '#shared/utils/retrieval/from-table'
import { alternativeSets, findLine, modelLine, strengthsOf, type ChosenLine } from '#shared/utils/retrieval/list-lines'
import { lineKey } from '~/utils/chart-data/line-key'

type Source = Pick<RetrievalDetail, 'settings' | 'lineTable' | 'result'>
interface Stored { line: ResultLine, place: number, chosen: ChosenLine }

/** The lines that can be switched: measured ones of the bands that the temperature rests on. */
export function switchableLines({ result }: Pick<RetrievalDetail, 'result'>): ResultLine[] {
  const bands = new Set(result?.lines.filter(line => line.used).map(line => line.band))
  return result?.lines.filter(line => bands.has(line.band) && (line.sigma !== null || line.intensity !== 0)) ?? []
}

/** Places of the measured areas among the result's lines: the areas come first, in their own order. */
function storedLines(lines: ResultLine[], list: LineList): Stored[] {
  return lines.flatMap((line, place) => {
    const band = list.bands.find(({ id }) => id === line.band)
    const found = band && findLine(band, line.label)
    return band && found ? [{ line, place, chosen: { band, line: found, label: line.label } }] : []
  })
}

function subCovariance({ areas, covariance }: { areas: number[], covariance: number[] }, stored: Stored[]): number[] {
  const n = areas.length
  const factor = ({ line, place }: Stored) => (areas[place] ? line.intensity / areas[place]! : 1)
  return stored.flatMap(a => stored.map(b => factor(a) * factor(b) * (covariance[a.place * n + b.place] ?? 0)))
}

function fromMeasurement({ settings, result }: Source, list: LineList, on: ReadonlySet<string>): LineRetrievalInput | null {
  const measurement = result?.spectrum?.measurement
  const set = result?.strengthSet
  if (!result || !measurement || !set) return null
  const wanted = new Set(switchableLines({ result }).map(lineKey))
  const stored = storedLines(result.lines, list).filter(({ line, place, chosen }) => wanted.has(lineKey(line)) && place < measurement.areas.length && strengthsOf(chosen.line, set) !== null)
  const used = stored.filter(({ line }) => on.has(lineKey(line))).map(({ chosen }) => chosen)
  if (used.length < on.size) return null
  const lines: MeasuredLine[] = stored.map(({ line, chosen }) => ({ ...modelLine(chosen, set), intensity: line.intensity, sigma: line.sigma, used: on.has(lineKey(line)) }))
  return {
    reading: { observable: settings.observable, backgroundTemperature: settings.Tbg, ...(settings.widthIn ? { widthIn: settings.widthIn } : {}) },
    lines,
    covariance: subCovariance(measurement, stored),
    noise: 'absolute',
    temperatureRange: settings.temperatureRange,
    bandScales: settings.bandScales,
    strengthSet: set,
    alternatives: alternativeSets(list, used, set).map(other => ({ ...other, einsteinA: stored.map(({ chosen }) => strengthsOf(chosen.line, other.name)) })),
    priorFlags: measurement.flags,
    cautions: result.cautions,
  }
}

/**
 * The engine's input for the stored measurement with other lines switched on (`on`: line keys). The stored covariance goes
 * along, so that with the stored choice the stored temperature comes out. Null where that cannot be had.
 */
export function recomputeInput(source: Source, list: LineList | null, on: ReadonlySet<string>): LineRetrievalInput | null {
  if (!source.lineTable) return list && fromMeasurement(source, list, on)
  const prepared = prepareFromTable({ table: source.lineTable, settings: { ...source.settings, lines: [] }, lineList: list })
  if ('problem' in prepared) return null
  return { ...prepared.input, lines: prepared.input.lines.map(line => ({ ...line, used: on.has(lineKey(line)) })) }
}
