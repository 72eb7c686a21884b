import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { phases } from '#shared/types/phases'
import { ApiError } from '~/utils/api-error'
import BaseError from '~/components/base/BaseError.vue'
import BaseNotice from '~/components/base/BaseNotice.vue'
import BasePhase from '~/components/base/BasePhase.vue'
import BaseProgress from '~/components/base/BaseProgress.vue'
import EnvelopePicture from '~/components/envelope/EnvelopePicture.vue'
import TemperatureValue from '~/components/temperature/TemperatureValue.vue'

describe('BasePhase', () => {
  it('tells every phase by its own word and its own sign, not by colour alone', async () => {
    const texts = await Promise.all(phases.map(async phase => (await mountSuspended(BasePhase, { props: { phase } })).text()))
    expect(new Set(texts).size).toBe(phases.length)
    expect(new Set(texts.map(text => text[0])).size).toBe(phases.length)
  })
})

describe('BaseProgress', () => {
  it('says its share in percent and stays within its ends', async () => {
    const bar = async (value: number | null) => (await mountSuspended(BaseProgress, { props: { value, max: 200, label: 'batch' } })).get('[role=progressbar]').attributes('aria-valuenow')
    expect(await bar(50)).toBe('25')
    expect(await bar(900)).toBe('100')
    expect(await bar(null)).toBeUndefined()
  })
})

describe('BaseNotice', () => {
  it('interrupts a screen reader only for a problem', async () => {
    expect((await mountSuspended(BaseNotice, { props: { kind: 'bad' } })).attributes('role')).toBe('alert')
    expect((await mountSuspended(BaseNotice, { props: { kind: 'warn' } })).attributes('role')).toBe('status')
  })
})

describe('BaseError', () => {
  it('shows the words of the server and each field that is wrong', async () => {
    const error = new ApiError('validation_failed', 'The table has a line without sigma.', 422, [{ path: 'lines.3.sigma', message: 'sigma must be greater than zero' }])
    const text = (await mountSuspended(BaseError, { props: { error } })).text()
    expect(text).toContain('The table has a line without sigma.')
    expect(text).toContain('lines.3.sigma')
  })

  it('shows nothing when nothing is wrong', async () => {
    expect((await mountSuspended(BaseError, { props: { error: null } })).text()).toBe('')
  })
})

describe('TemperatureValue', () => {
  it('never shows a number without its unit and its uncertainty', async () => {
    const text = (await mountSuspended(TemperatureValue, { props: { value: 187.42, uNoise: 1.31, uSystematic: 2.1 } })).text()
    expect(text.replace(/\s+/g, ' ')).toBe('187.4 ± 1.3 [2.1] K')
  })
})

describe('EnvelopePicture', () => {
  it('draws the lines that were used and names them for those who do not see it', async () => {
    const lines = [{ label: 'P1(2)', termEnergy: 0, intensity: 800, model: 790, used: true }, { label: 'P1(3)', termEnergy: 75, intensity: 400, model: null, used: false }]
    const picture = await mountSuspended(EnvelopePicture, { props: { lines } })
    expect(picture.get('svg').attributes('aria-label')).toBe('1 line: P1(2)')
    expect(picture.findAll('g')).toHaveLength(1)
  })
})
