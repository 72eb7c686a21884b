import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'

const data = process.env.TROTLINE_DATA_DIR ?? resolve(import.meta.dirname, '../../.data')

/** A TROTLINE_ variable: from the environment, or else from what the running start wrote down. */
export function setting(name) {
  const value = process.env[name] ?? readRunEnv()[name]
  if (value === undefined) throw new Error(`${name} is not set and no start is running here (bash docker-free-scripts/start.sh).`)
  return value
}

function readRunEnv() {
  try {
    return parseEnv(readFileSync(`${data}/run/env`, 'utf8'))
  }
  catch {
    return {}
  }
}

/** Lines of NAME=value, with or without `export` and quotes. */
export function parseEnv(text) {
  const pairs = [...text.matchAll(/^(?:export\s+)?([A-Z_]+)=(.*)$/gm)]
  return Object.fromEntries(pairs.map(([, name, value]) => [name, value.trim().replace(/^(['"])(.*)\1$/, '$2')]))
}
