import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'

const read = id => JSON.parse(readFileSync(fileURLToPath(new URL(`../../shared/line-lists/${id}.json`, import.meta.url)), 'utf8'))

export const ohMeinel = read('oh-meinel')
export const coRotation = read('co-rotation')
