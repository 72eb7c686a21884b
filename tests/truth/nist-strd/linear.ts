import { readFileSync } from 'node:fs'
import { fromDecimal, times } from '../validation/rational'
import type { Rational } from '../validation/rational'

/** A linear dataset: exact rows of the design matrix and responses, and the certified values as the copies print them. */
export interface LinearDataset {
  rows: Rational[][]
  y: Rational[]
  certified: { beta: number[], error: number[], residualDeviation: number }
}

/** Degree of the polynomial in the one predictor, or the predictors as they stand with or without a constant. */
const designs: Record<string, number | 'plain' | 'with constant'> = {
  norris: 1, pontius: 2, noint1: 'plain', noint2: 'plain', filip: 10, longley: 'with constant', wampler1: 5, wampler2: 5, wampler3: 5, wampler4: 5, wampler5: 5,
}

export const linearNames = Object.keys(designs)

const table = (file: string) => readFileSync(new URL(`./linear/${file}`, import.meta.url), 'utf8').trim().split('\n').slice(1).map(line => line.split(','))

export function readLinearDataset(name: string): LinearDataset {
  const data = table(`${name}.csv`).map(row => row.map(fromDecimal))
  const certified = table(`${name}.certified.csv`)
  const one: Rational = { n: 1n, d: 1n }
  const design = designs[name]
  const rows = data.map(([, ...x]) => {
    if (design === 'plain') return x
    if (design === 'with constant') return [one, ...x]
    return Array.from({ length: design }).reduce<Rational[]>(powers => [...powers, times(powers.at(-1)!, x[0])], [one])
  })
  return {
    rows,
    y: data.map(row => row[0]),
    certified: { beta: certified.map(row => Number(row[0])), error: certified.map(row => Number(row[1])), residualDeviation: Number(certified[0][2]) },
  }
}
