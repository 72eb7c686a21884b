import { describe, expect, it } from 'vitest'
import { ConfigError, readConfig } from '~~/server/config'

const complete = {
  TROTLINE_DATABASE_URL: 'mysql://u:p@127.0.0.1:3306/trotline',
  TROTLINE_REDIS_URL: 'redis://127.0.0.1:6379',
  TROTLINE_SMTP_URL: 'smtp://127.0.0.1:1025',
}

describe('the environment', () => {
  it('has a default for everything but the three services', () => {
    expect(readConfig(complete)).toMatchObject({ role: 'web', origin: 'http://127.0.0.1:4310', instance: 'main', workerConcurrency: 4, trustProxy: false })
  })

  it('takes the limits of the contract when none are set', () => {
    expect(readConfig(complete).limits).toEqual({
      fileBytes: 32 * 1024 ** 2, requestBytes: 256 * 1024 ** 2, jsonBytes: 8 * 1024 ** 2,
      files: 200, pixels: 1_000_000, tableLines: 2000, spectra: 1000, fitSeconds: 60,
    })
  })

  it('names every variable that is missing or wrong, at once', () => {
    const read = () => readConfig({ TROTLINE_REDIS_URL: 'http://x', TROTLINE_SMTP_URL: complete.TROTLINE_SMTP_URL, TROTLINE_WORKER_CONCURRENCY: '0' })
    expect(read).toThrow(ConfigError)
    expect(read).toThrow(/TROTLINE_DATABASE_URL: is not set/)
    expect(read).toThrow(/TROTLINE_REDIS_URL: must look like/)
    expect(read).toThrow(/TROTLINE_WORKER_CONCURRENCY/)
  })

  it('never repeats the value of a wrong variable, which may hold a password', () => {
    expect(() => readConfig({ ...complete, TROTLINE_DATABASE_URL: 'postgres://u:hush-hush@h/db' })).not.toThrow(/hush-hush/)
  })

  it('refuses plain http anywhere but on loopback', () => {
    expect(() => readConfig({ ...complete, TROTLINE_ORIGIN: 'http://trotline.example.org' })).toThrow(/https/)
    expect(readConfig({ ...complete, TROTLINE_ORIGIN: 'https://trotline.example.org/' }).origin).toBe('https://trotline.example.org')
    expect(readConfig({ ...complete, TROTLINE_ORIGIN: 'http://[::1]:4310' }).origin).toBe('http://[::1]:4310')
  })
})
