import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ColumnQuestion from '~/components/submit/ColumnQuestion.vue'
import PreviewFit from '~/components/submit/PreviewFit.vue'
import QueueBar from '~/components/submit/QueueBar.vue'

const preview = (over: object) => mountSuspended(PreviewFit, { props: { answer: null, busy: false, problem: null, ready: true, hasSettings: true, ...over } })

describe('the preview', () => {
  it('says what it waits for', async () => {
    expect((await preview({ ready: false })).text()).toContain('as soon as every question is answered')
    expect((await preview({ hasSettings: false })).text()).toContain('Choose a recipe')
  })
  it('says why a file cannot be fitted', async () => {
    const wrapper = await preview({ answer: { result: null, problems: [{ path: 'observable', message: 'The values count energy, the settings read photon-emission: change one of them.' }] } })
    expect(wrapper.text()).toContain('change one of them')
  })
})

describe('the question about columns', () => {
  const mount = () => mountSuspended(ColumnQuestion, { props: { names: ['column 1', 'column 2', 'column 3'], rows: [[1, 10, 0.1]], answer: undefined } })
  it('is answered once axis, values and uncertainty are chosen', async () => {
    const wrapper = await mount()
    const [axis, values, sigma] = wrapper.findAll('select')
    await axis!.setValue('0')
    await values!.setValue('1')
    expect(wrapper.emitted('answer')).toBeUndefined()
    await sigma!.setValue('-1')
    expect(wrapper.emitted('answer')).toEqual([[{ axis: 0, values: 1, sigma: null }]])
  })
  it('refuses one column as two things', async () => {
    const wrapper = await mount()
    for (const select of wrapper.findAll('select')) await select.setValue('1')
    expect(wrapper.emitted('answer')).toBeUndefined()
    expect(wrapper.text()).toContain('Each column can be only one of these.')
  })
})

describe('the bar with the button', () => {
  const bar = (over: object) => mountSuspended(QueueBar, { props: { label: 'Queue 2 retrievals', left: null, busy: false, sent: 0, total: 0, error: null, note: '', ...over } })
  it('says what is left instead of letting an unfinished submission go', async () => {
    const wrapper = await bar({ left: '2 files still ask something.' })
    expect(wrapper.get('[data-testid=queue]').attributes('disabled')).toBeDefined()
    expect(wrapper.get('[role=status]').text()).toBe('2 files still ask something.')
  })
  it('counts files while they are stored', async () => {
    expect((await bar({ busy: true, sent: 50, total: 120 })).text()).toContain('50 of 120 files stored.')
  })
  it('offers to try again after a failure', async () => {
    const wrapper = await bar({ error: new Error('down') })
    await wrapper.get('[role=alert] button').trigger('click')
    expect(wrapper.emitted('queue')).toHaveLength(1)
  })
})
