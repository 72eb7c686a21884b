import { readdirSync, readFileSync } from 'node:fs'
import { join, relative, resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')
const anId = '01ARZ3NDEKTSV4RRFFQ69G5FAV'

export interface ApiRoute { file: string, method: string, path: string, source: string }

const filesBelow = (folder: string, pattern: RegExp): string[] =>
  readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' }).filter(name => pattern.test(name)).map(name => relative(root, join(root, folder, name)))

/** Every route file under server/api with its method and an address that fits it; catch-alls are left out. */
export const apiRoutes = (): ApiRoute[] => filesBelow('server/api', /\.ts$/).filter(file => !file.includes('[...')).map((file) => {
  const [, path, method] = /^server(\/api\/.+?)(?:\.(get|post|put|patch|delete))?\.ts$/.exec(file)!
  return { file, method: (method ?? 'get').toUpperCase(), path: filled(path!), source: readFileSync(join(root, file), 'utf8') }
})

/** Every page with an address that fits it. */
export const pages = (): { file: string, path: string, source: string }[] => filesBelow('app/pages', /\.vue$/).map(file => ({
  file,
  path: filled(file.replace(/^app\/pages/, '').replace(/\.vue$/, '')),
  source: readFileSync(join(root, file), 'utf8'),
}))

const filled = (path: string): string => path.replace(/\/index$/, '').replace(/\[[^\]]+\]/g, anId) || '/'
