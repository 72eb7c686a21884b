import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'

/** A dataset of the nonlinear collection. */
export interface NistDataset {
  name: string
  starts: [number[], number[]]
  certified: { parameters: number[], deviations: number[], sumOfSquares: number, residualDeviation: number, dof: number }
  y: number[]
  x: number[][]
}

const folder = fileURLToPath(new URL('./nonlinear/', import.meta.url))

/** Names of the datasets, in the order of the alphabet. */
export const nistNames = readdirSync(folder).filter(file => file.endsWith('.dat')).map(file => file.slice(0, -4)).sort()

const labelled = (text: string, label: string) => Number(new RegExp(`${label}:\\s+(\\S+)`).exec(text)![1])

export function readNistDataset(name: string): NistDataset {
  const text = readFileSync(`${folder}${name}.dat`, 'latin1')
  const rows = [...text.matchAll(/^\s*b\d+\s*=\s*(.+)$/gm)].map(match => match[1].trim().split(/\s+/).map(Number))
  const data = text.slice(text.lastIndexOf('Data:')).split(/\r?\n/).slice(1).filter(line => line.trim() !== '').map(line => line.trim().split(/\s+/).map(Number))
  const count = Number(/(\d+) Observations/.exec(text)![1])
  if (data.length !== count || rows.length === 0 || rows.some(row => row.length !== 4 || row.some(Number.isNaN))) throw new Error(`${name} could not be read`)
  return {
    name,
    starts: [rows.map(row => row[0]), rows.map(row => row[1])],
    certified: {
      parameters: rows.map(row => row[2]),
      deviations: rows.map(row => row[3]),
      sumOfSquares: labelled(text, 'Residual Sum of Squares'),
      residualDeviation: labelled(text, 'Residual Standard Deviation'),
      dof: labelled(text, 'Degrees of Freedom'),
    },
    y: data.map(row => row[0]),
    x: data.map(row => row.slice(1)),
  }
}
