import { execFile } from 'node:child_process'
import { createServer } from 'node:net'
import { existsSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { promisify } from 'node:util'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'

const run = promisify(execFile)
const root = resolve(import.meta.dirname, '../..')
const folder = join(process.env.TROTLINE_DATA_DIR ?? join(root, '.data-test'), 'scripts')
const ports = { TROTLINE_WEB_PORT: '4710', TROTLINE_MARIADB_PORT: '4711', TROTLINE_REDIS_PORT: '4712', TROTLINE_SMTP_PORT: '4713', TROTLINE_MAIL_WEB_PORT: '4714', TROTLINE_WORKER_PORT: '4715' }
const origin = 'http://127.0.0.1:4710'
const environment = { ...process.env, ...ports, TROTLINE_DATA_DIR: folder, TROTLINE_INSTANCE: 'scripts', TROTLINE_BUILD_DIR: process.env.TROTLINE_BUILD_DIR ?? join(root, '.data/build') }

/** Exit code and output of a script. */
async function script(name: string, options: string[] = [], extra: Record<string, string> = {}): Promise<{ code: number, output: string, seconds: number }> {
  const begun = Date.now()
  const seconds = () => (Date.now() - begun) / 1000
  try {
    const { stdout, stderr } = await run('bash', [`docker-free-scripts/${name}`, ...options], { cwd: root, env: { ...environment, ...extra } })
    return { code: 0, output: stdout + stderr, seconds: seconds() }
  }
  catch (error) {
    const { code, stdout, stderr } = error as { code: number, stdout: string, stderr: string }
    return { code, output: stdout + stderr, seconds: seconds() }
  }
}

const status = async (address: string): Promise<number> => {
  try { return (await fetch(address)).status }
  catch { return 0 }
}
const pidOf = (name: string): number => Number(readFileSync(join(folder, 'run', `${name}.pid`), 'utf8').split(' ')[0])
const isAlive = (pid: number): boolean => existsSync(`/proc/${pid}`) && !readFileSync(`/proc/${pid}/stat`, 'utf8').includes(') Z ')

describe('the start and stop scripts, beside the stack of the other tests', () => {
  beforeAll(() => rmSync(folder, { recursive: true, force: true }))
  afterAll(async () => { await script('stop.sh') })

  it('start an empty service and print the one-time set-up link', async () => {
    const { code, output } = await script('start.sh', ['--no-demo'])
    expect(output).toMatch(new RegExp(`${origin}/set-up/\\S{20,}`))
    expect(code).toBe(0)
    expect(await status(`${origin}/api/ready`)).toBe(200)
  })

  it('find everything running on a second start in under 8 seconds', async () => {
    const web = pidOf('web')
    const { code, seconds } = await script('start.sh', ['--no-demo'])
    expect(code).toBe(0)
    expect(seconds).toBeLessThan(8)
    expect(pidOf('web')).toBe(web)
  })

  it('start again after a stop in under 8 seconds', async () => {
    await script('stop.sh')
    const { code, seconds } = await script('start.sh', ['--no-demo'])
    expect(code).toBe(0)
    expect(seconds).toBeLessThan(8)
  })

  it('leave a stack with other ports, folder and cookie name undisturbed', async () => {
    expect(await status(`${process.env.TROTLINE_TEST_ORIGIN}/api/ready`)).toBe(200)
    const environments = [join(folder, 'run/env'), process.env.TROTLINE_TEST_ENV_FILE!].map(path => readFileSync(path, 'utf8').split('\n').filter(Boolean))
    const values = ['TROTLINE_DATABASE_URL', 'TROTLINE_REDIS_URL', 'TROTLINE_SMTP_URL', 'TROTLINE_ORIGIN', 'TROTLINE_STORAGE_DIR', 'TROTLINE_INSTANCE']
    for (const name of values) {
      const [ours, theirs] = environments.map(lines => lines.find(line => line.startsWith(`${name}=`)))
      expect(ours, name).toBeDefined()
      expect(ours, name).not.toBe(theirs)
    }
  })

  it('refuse an option they do not know', async () => {
    const { code, output } = await script('start.sh', ['--demo-please'])
    expect(code).toBe(1)
    expect(output).toContain('--no-demo')
  })

  it('stop exactly what was started, and never a process that has only inherited a PID', async () => {
    const started = ['web', 'worker', 'mariadb', 'redis', 'maildev'].map(pidOf)
    const bystander = execFile('sleep', ['300'])
    const web = pidOf('web')
    // The record names a process that lives, but began at another time.
    writeFileSync(join(folder, 'run/web.pid'), `${bystander.pid} 1\n`)
    await script('stop.sh')
    expect(isAlive(bystander.pid!)).toBe(true)
    expect(isAlive(web)).toBe(true)
    bystander.kill('SIGKILL')
    process.kill(web, 'SIGTERM')
    for (const pid of started.filter(one => one !== web)) expect(isAlive(pid), String(pid)).toBe(false)
    expect(await status(`${process.env.TROTLINE_TEST_ORIGIN}/api/ready`)).toBe(200)
  })

  it('name the variable that changes a port which is taken', async () => {
    const blocker = createServer().listen(4712, '127.0.0.1')
    await new Promise(done => blocker.once('listening', done))
    const { code, output } = await script('start.sh', ['--no-demo'])
    await new Promise(done => blocker.close(done))
    await script('stop.sh')
    expect(code).toBe(1)
    expect(output).toContain('Port 4712 (Redis) is taken')
    expect(output).toContain('TROTLINE_REDIS_PORT=')
  })

  it('say in one sentence what to install when a server is missing and only root could install it', async () => {
    // A PATH on which everything but MariaDB's client is found, and an `id` that tells of a user without rights.
    const path = mkdtempSync(join(tmpdir(), 'trotline-path-'))
    for (const tool of ['bash', 'dirname', 'mkdir', 'flock', 'date', 'node', 'npm', 'cat', 'awk', 'curl', 'redis-server', 'sha256sum', 'cut'])
      symlinkSync((await run('which', [tool])).stdout.trim(), join(path, tool))
    writeFileSync(join(path, 'id'), '#!/bin/bash\necho 1000\n', { mode: 0o755 })
    const { code, output } = await script('start.sh', ['--no-demo'], { PATH: path })
    expect(code).toBe(1)
    expect(output.trim().split('\n')).toHaveLength(1)
    expect(output).toContain('apt-get install --no-install-recommends mariadb-client')
  })
})
