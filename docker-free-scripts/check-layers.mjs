// Who may import whom (docs/ARCHITECTURE.md). Reads every import of the tree and fails on one that passes a closed door.
import { readFileSync } from 'node:fs'
import { execFileSync } from 'node:child_process'
import { dirname, join, normalize } from 'node:path'

const files = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard', 'app', 'server', 'shared'], { encoding: 'utf8' })
  .split('\n').filter(file => /\.(ts|vue|mjs)$/.test(file))

/** Open to every server file. */
const foundation = ['server/config', 'server/logger', 'server/lifecycle', 'server/secrets', 'server/database/ids', 'server/version', 'server/metrics']

/** First match decides. `local`: prefixes of project paths; `packages`: npm names; both exact lists of what may pass. */
const rules = [
  { from: 'shared/engine/', local: ['shared/engine/'], packages: [] },
  { from: 'shared/line-lists/', local: ['shared/line-lists/', 'shared/types/'], packages: [] },
  { from: 'shared/formats/', local: ['shared/formats/', 'shared/types/', 'shared/engine/units/', 'shared/engine/types', 'shared/schemas/'], packages: ['csv-parse', 'zod', 'fflate'] },
  { from: 'shared/types/', local: ['shared/types/', 'shared/engine/types', 'shared/schemas/'], packages: ['zod'] },
  { from: 'shared/', local: ['shared/schemas/', 'shared/utils/', 'shared/types/', 'shared/engine/'], packages: ['zod'] },
  { from: 'server/database/', local: ['server/database/', ...foundation, 'shared/'], packages: ['drizzle-orm', 'mysql2', 'ulid', 'zod'] },
  { from: 'server/jobs/handlers/', local: ['server/jobs/', 'server/services/', 'server/mail/', ...foundation, 'server/database/ids', 'shared/'], packages: ['bullmq', 'ioredis'] },
  { from: 'server/jobs/', local: ['server/jobs/', ...foundation, 'shared/'], packages: ['bullmq', 'ioredis', 'zod'] },
  { from: 'server/mail/', local: ['server/mail/', ...foundation, 'shared/'], packages: ['nodemailer'] },
  { from: 'server/threads/', local: ['server/threads/', 'shared/'], packages: ['esbuild', '#compute-thread'] },
  { from: 'server/services/', local: ['server/services/', 'server/threads/', 'server/database/', 'server/jobs/', 'server/mail/', ...foundation, 'shared/'], not: ['h3', 'bullmq', 'ioredis', 'nodemailer', 'nitropack'] },
  { from: 'server/version', local: ['package.json'], packages: [] },
  { from: 'server/metrics', local: foundation, packages: ['prom-client'] },
  { from: 'server/utils/start-up', local: ['server/database/', ...foundation], not: ['bullmq'] },
  { from: 'server/plugins/', local: ['server/', 'shared/'], not: ['bullmq'] },
  { from: 'server/', local: ['server/services/', 'server/utils/', ...foundation, 'shared/'], not: ['drizzle-orm', 'bullmq', 'ioredis', 'mysql2', 'nodemailer'] },
  { from: 'app/workers/', local: ['app/', 'shared/'], not: ['drizzle-orm', 'bullmq', 'ioredis', 'mysql2'] },
  { from: 'app/', local: ['app/', 'shared/'], not: ['drizzle-orm', 'bullmq', 'ioredis', 'mysql2', 'nodemailer', 'h3'] },
]

const importPattern = /(?:^|\n)\s*(?:import|export)\s[^'"]*?from\s*['"]([^'"]+)['"]|(?:^|\n)\s*import\s*['"]([^'"]+)['"]|import\(\s*['"]([^'"]+)['"]\s*\)/g

const resolve = (file, specifier) => {
  if (specifier.startsWith('.')) return normalize(join(dirname(file), specifier))
  for (const [alias, folder] of [['#shared/', 'shared/'], ['~~/', ''], ['@@/', ''], ['~/', 'app/'], ['@/', 'app/']])
    if (specifier.startsWith(alias)) return folder + specifier.slice(alias.length)
  return null
}
const packageName = specifier => specifier.split('/').slice(0, specifier.startsWith('@') ? 2 : 1).join('/')

let imports = 0
const leaks = []
for (const file of files) {
  const rule = rules.find(({ from }) => file.startsWith(from))
  if (!rule) continue
  for (const match of readFileSync(file, 'utf8').matchAll(importPattern)) {
    const specifier = match[1] ?? match[2] ?? match[3]
    imports++
    const target = resolve(file, specifier)
    const allowed = target === null
      ? (rule.packages ? rule.packages.includes(packageName(specifier)) || (rule.from !== 'shared/engine/' && specifier.startsWith('node:') && file.startsWith('server/')) : !rule.not.includes(packageName(specifier)))
      : rule.local.some(prefix => target.startsWith(prefix) || `${target}/` === prefix)
    if (!allowed) leaks.push(`${file} may not import ${specifier}`)
  }
}

if (imports === 0) leaks.push('No import was found: the check itself is broken.')
console.log(leaks.length ? leaks.join('\n') : `Layers: ${imports} imports in ${files.length} files, every one through an open door.`)
process.exit(leaks.length ? 1 : 0)
