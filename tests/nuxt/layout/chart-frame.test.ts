import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ChartFrame from '~/components/chart/ChartFrame.vue'

const frame = () => mountSuspended(ChartFrame, { props: { title: 'Temperature', summary: 'Ridge: 3 temperatures, mean 190.0 K.', csv: { name: 'series', columns: ['t'], rows: [[1]] }, height: 320 } })

describe('ChartFrame', () => {
  it('holds the place of the picture before it is drawn', async () => {
    expect((await frame()).get('[aria-roledescription=chart]').attributes('style')).toContain('320px')
  })

  it('can be focused and is described by its summary in words', async () => {
    const wrapper = await frame()
    const stage = wrapper.get('[aria-roledescription=chart]')
    expect(stage.attributes('tabindex')).toBe('0')
    expect(wrapper.get(`[id="${stage.attributes('aria-describedby')}"]`).text()).toBe('Ridge: 3 temperatures, mean 190.0 K.')
  })

  it('offers the picture and its numbers as files', async () => {
    expect((await frame()).findAll('figcaption button').map(button => button.text())).toEqual(['Show all', 'PNG', 'CSV', 'Print'])
  })
})
