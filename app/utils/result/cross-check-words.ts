import { printTemperature } from '#shared/engine/format-value'
import type { CrossCheck } from '#shared/engine/types'
import { intervalWords } from './number-words'

const titles: Record<CrossCheck['method'], string> = {
  'boltzmann-plot': 'Boltzmann plot, straight line',
  'two-line-ratio': 'two-line ratio',
  'strongest-line': 'strongest line',
}

export function crossCheckWords({ method, temperature, uncertainty, interval, note }: CrossCheck) {
  const value = temperature === null
    ? interval ? intervalWords(interval) : 'no value'
    : uncertainty === null && interval ? intervalWords(interval) : printTemperature({ value: temperature, uNoise: uncertainty }).text
  return { title: titles[method], value, note }
}
