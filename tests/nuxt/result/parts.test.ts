import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import type { RetrievalDetail } from '#shared/types/retrieval'
import LineTable from '~/components/result/LineTable.vue'
import PhasePanel from '~/components/result/PhasePanel.vue'
import ReviewBar from '~/components/result/ReviewBar.vue'
import TemperatureHeadline from '~/components/result/TemperatureHeadline.vue'
import { lineKey } from '~/utils/chart-data/line-key'

const component = (termUpper: number, gUpper: number) => ({ wavenumber: 6000 + termUpper, termUpper, termLower: 0, gUpper, gLower: 1, einsteinA: 1 })
const lines = [[0, 4, 400], [75, 6, 340], [180, 8, 200]].map(([energy, g, intensity], index) => ({ label: `L${index}`, band: 'b', components: [component(energy!, g!)], intensity: intensity!, sigma: 4, used: true }))
const result = retrieveFromLines({ reading: { observable: 'photon-emission' }, lines, noise: 'absolute', strengthSet: 'given' })
const detail = (over: Partial<RetrievalDetail>) => ({ phase: 'QUEUED', progress: 0, reason: null, revision: 1, reviews: [], may: { abort: true, revise: false, review: false, submit: false }, ...over }) as RetrievalDetail

describe('the temperature', () => {
  it('stands with noise, interval and strength set', async () => {
    const text = (await mountSuspended(TemperatureHeadline, { props: { result } })).text()
    expect(text).toContain(`${result.temperature!.value.toFixed(1)} K`)
    expect(text).toMatch(/± \d+\.\d noise/)
    expect(text).toContain('strength set given')
  })
  it('says why there is none', async () => {
    const none = { ...result, temperature: null, reason: 'Only one line is left; a temperature needs two.' }
    expect((await mountSuspended(TemperatureHeadline, { props: { result: none } })).text()).toContain('Only one line is left')
  })
  it('keeps the stored number in sight while lines are switched', async () => {
    expect((await mountSuspended(TemperatureHeadline, { props: { result, before: result } })).get('[data-testid=temperature-before]').text()).toContain('Stored:')
  })
})

describe('the line table', () => {
  const keys = result.lines.map(lineKey)
  const table = () => mountSuspended(LineTable, { props: { lines: result.lines, on: new Set(keys.slice(0, 2)), severalBands: false, uNoise: 1, switchable: new Set(keys.slice(1)), hot: null } })
  it('shows which lines are on and asks to switch one', async () => {
    const boxes = (await table()).findAll('input')
    expect(boxes.map(box => (box.element as HTMLInputElement).checked)).toEqual([true, true, false])
    expect(boxes[0]!.attributes('disabled')).toBeDefined()
  })
  it('ties the row under the pointer to the pictures', async () => {
    const wrapper = await table()
    await wrapper.findAll('tbody tr')[1]!.trigger('mouseenter')
    expect(wrapper.emitted('update:hot')![0]).toEqual([keys[1]])
    await wrapper.findAll('input')[1]!.trigger('change')
    expect(wrapper.emitted('switch')).toEqual([[keys[1]]])
  })
})

describe('a retrieval on its way', () => {
  it('shows its progress and that the page may be left', async () => {
    const wrapper = await mountSuspended(PhasePanel, { props: { detail: detail({ phase: 'EXECUTING', progress: 0.5 }), waiting: false } })
    expect(wrapper.get('[role=progressbar]').attributes('aria-valuenow')).toBe('50')
    expect(wrapper.text()).toContain('moves to the result by itself')
  })
  it('says why it failed and what to do', async () => {
    const text = (await mountSuspended(PhasePanel, { props: { detail: detail({ phase: 'ERROR', reason: 'The spectrum holds none of the lines.' }), waiting: false } })).text()
    expect(text).toContain('The spectrum holds none of the lines.')
    expect(text).toContain('Mend what the reason names')
  })
})

describe('the review', () => {
  const may = { abort: false, revise: false, review: true, submit: false }
  it('returns a result only with a note', async () => {
    const wrapper = await mountSuspended(ReviewBar, { props: { detail: detail({ may }), busy: false } })
    await wrapper.findAll('button')[1]!.trigger('click')
    await wrapper.findAll('button')[0]!.trigger('click')
    expect(wrapper.emitted('review')).toBeUndefined()
    expect(wrapper.text()).toContain('Say what has to be mended')
    await wrapper.get('textarea').setValue('Which lines are these?')
    await wrapper.findAll('button')[0]!.trigger('click')
    expect(wrapper.emitted('review')).toEqual([['return', 'Which lines are these?']])
  })
  it('is only told to those who may not give one', async () => {
    const wrapper = await mountSuspended(ReviewBar, { props: { detail: detail({}), busy: false } })
    expect(wrapper.findAll('button')).toHaveLength(0)
    expect(wrapper.text()).toContain('Not reviewed yet.')
  })
})
