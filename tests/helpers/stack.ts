import { execFile, spawn, type ChildProcess } from 'node:child_process'
import { mkdirSync, openSync, readFileSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { join, resolve } from 'node:path'
import { promisify } from 'node:util'

const run = promisify(execFile)
const root = resolve(import.meta.dirname, '../..')

/** A whole Trotline of its own: services, web and workers on free ports, everything under one folder. */
export interface Stack {
  folder: string
  origin: string
  databaseUrl: string
  redisUrl: string
  maildevUrl: string
  storageFolder: string
  environment: Record<string, string>
  web: ChildProcess | null
  workers: ChildProcess[]
}

export const sleep = (milliseconds: number): Promise<void> => new Promise(done => setTimeout(done, milliseconds))

export async function eventually<T>(question: () => Promise<T | false | null | undefined>, what: string, seconds = 60): Promise<T> {
  const end = Date.now() + seconds * 1000
  let last: unknown = null
  while (Date.now() < end) {
    try {
      const answer = await question()
      if (answer) return answer
    }
    catch (error) { last = error }
    await sleep(150)
  }
  throw new Error(`Did not come about within ${seconds} s: ${what}${last ? ` (${String(last)})` : ''}`)
}

const freePort = (): Promise<number> => new Promise((done, failed) => {
  const server = createServer()
  server.on('error', failed)
  server.listen(0, '127.0.0.1', () => {
    const { port } = server.address() as { port: number }
    server.close(() => done(port))
  })
})

/** Starts the services and reads the environment that both roles need; no process of ours yet. */
export async function createStack(name: string, extra: Record<string, string> = {}): Promise<Stack> {
  const folder = join(process.env.TROTLINE_DATA_DIR ?? join(root, '.data-test'), name)
  rmSync(folder, { recursive: true, force: true })
  mkdirSync(folder, { recursive: true })
  const [mariadb, redis, smtp, mail, web] = await Promise.all(Array.from({ length: 5 }, freePort)) as [number, number, number, number, number]
  const scripts = {
    TROTLINE_DATA_DIR: folder,
    TROTLINE_MARIADB_PORT: String(mariadb),
    TROTLINE_REDIS_PORT: String(redis),
    TROTLINE_SMTP_PORT: String(smtp),
    TROTLINE_MAIL_WEB_PORT: String(mail),
    TROTLINE_WEB_PORT: String(web),
    TROTLINE_INSTANCE: name,
  }
  await run('bash', ['docker-free-scripts/services.sh', 'start'], { cwd: root, env: { ...process.env, ...scripts } })
  const environment: Record<string, string> = { ...scripts }
  for (const line of readFileSync(join(folder, 'run/env'), 'utf8').split('\n')) {
    const [key, ...value] = line.split('=')
    if (key) environment[key] = value.join('=')
  }
  Object.assign(environment, extra)
  return {
    folder,
    origin: environment.TROTLINE_ORIGIN!,
    databaseUrl: environment.TROTLINE_DATABASE_URL!,
    redisUrl: environment.TROTLINE_REDIS_URL!,
    maildevUrl: `http://127.0.0.1:${mail}`,
    storageFolder: environment.TROTLINE_STORAGE_DIR!,
    environment,
    web: null,
    workers: [],
  }
}

function startRole(stack: Stack, role: 'web' | 'worker', port: number): ChildProcess {
  const build = process.env.TROTLINE_TEST_BUILD
  if (!build) throw new Error('TROTLINE_TEST_BUILD names the build to test; docker-free-scripts/test.sh sets it.')
  const log = openSync(join(stack.folder, 'logs', `${role}.log`), 'a')
  return spawn('node', [join(build, 'server/index.mjs')], {
    stdio: ['ignore', log, log],
    env: { ...process.env, ...stack.environment, NODE_ENV: 'production', TROTLINE_ROLE: role, NITRO_HOST: '127.0.0.1', NITRO_PORT: String(port) },
  })
}

const isReady = (origin: string) => async () => (await fetch(`${origin}/api/ready`)).ok

export async function startWeb(stack: Stack): Promise<ChildProcess> {
  stack.web = startRole(stack, 'web', Number(stack.environment.TROTLINE_WEB_PORT))
  await eventually(isReady(stack.origin), 'the web process is ready')
  return stack.web
}

export async function startWorker(stack: Stack): Promise<ChildProcess> {
  const port = await freePort()
  const worker = startRole(stack, 'worker', port)
  stack.workers.push(worker)
  await eventually(isReady(`http://127.0.0.1:${port}`), 'the worker is ready')
  return worker
}

const ended = (child: ChildProcess): Promise<void> =>
  child.exitCode !== null || child.signalCode !== null ? Promise.resolve() : new Promise(done => child.once('exit', () => done()))

export async function stop(child: ChildProcess, signal: NodeJS.Signals = 'SIGTERM'): Promise<void> {
  child.kill(signal)
  await ended(child)
}

/** Ends a service as a power cut would. */
export function killService(stack: Stack, name: 'mariadb' | 'redis' | 'maildev'): void {
  const [pid] = readFileSync(join(stack.folder, `run/${name}.pid`), 'utf8').split(' ')
  process.kill(Number(pid), 'SIGKILL')
}

export const killDatabase = (stack: Stack): void => killService(stack, 'mariadb')

export async function stopWorkers(stack: Stack): Promise<void> {
  await Promise.all(stack.workers.splice(0).map(worker => stop(worker)))
}

/** Starts again whichever of the services is not running. */
export async function startServices(stack: Stack): Promise<void> {
  await run('bash', ['docker-free-scripts/services.sh', 'start'], { cwd: root, env: { ...process.env, ...stack.environment } })
}

export async function emptyRedis(stack: Stack): Promise<void> {
  await run('redis-cli', ['-p', stack.environment.TROTLINE_REDIS_PORT!, 'FLUSHALL'])
}

/** The five demo accounts; with `demo` also the invented campaigns. */
export async function seed(stack: Stack, what: 'accounts' | 'demo'): Promise<void> {
  await run('node', ['docker-free-scripts/seed.mjs', what === 'demo' ? '--demo' : '--accounts-only'], { cwd: root, env: { ...process.env, ...stack.environment } })
}

export async function destroyStack(stack: Stack): Promise<void> {
  for (const child of [stack.web, ...stack.workers]) if (child) await stop(child)
  await run('bash', ['docker-free-scripts/services.sh', 'stop'], { cwd: root, env: { ...process.env, ...stack.environment } })
}
