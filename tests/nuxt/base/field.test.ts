import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { h } from 'vue'
import BaseField from '~/components/base/BaseField.vue'
import BaseInput from '~/components/base/BaseInput.vue'
import BaseSelect from '~/components/base/BaseSelect.vue'

const field = (props: { label: string, hint?: string, error?: string, required?: boolean }) =>
  mountSuspended(BaseField, { props, slots: { default: () => h(BaseInput, { modelValue: '' }) } })

describe('BaseField', () => {
  it('ties its label to the control inside', async () => {
    const wrapper = await field({ label: 'Latitude' })
    expect(wrapper.get('label').attributes('for')).toBe(wrapper.get('input').attributes('id'))
  })

  it('names hint and error as descriptions, in this order', async () => {
    const wrapper = await field({ label: 'Latitude', hint: 'degrees north', error: 'Too large.' })
    const texts = wrapper.get('input').attributes('aria-describedby')!.split(' ').map(id => wrapper.get(`[id="${id}"]`).text())
    expect(texts[0]).toBe('degrees north')
    expect(texts[1]).toContain('Too large.')
  })

  it('marks the control invalid only while there is an error', async () => {
    const wrapper = await field({ label: 'Latitude' })
    expect(wrapper.get('input').attributes('aria-invalid')).toBeUndefined()
    await wrapper.setProps({ error: 'Too large.' })
    expect(wrapper.get('input').attributes('aria-invalid')).toBe('true')
    expect(wrapper.get('[role=alert]').text()).toContain('Too large.')
  })

  it('hands "required" to the control', async () => {
    expect((await field({ label: 'Name', required: true })).get('input').attributes('required')).toBeDefined()
  })
})

describe('BaseSelect', () => {
  it('gives back the value of an option, null included', async () => {
    const wrapper = await mountSuspended(BaseSelect, { props: { modelValue: 'nm', options: [{ value: null, label: 'not stated' }, { value: 'nm', label: 'nm' }] } })
    await wrapper.get('select').setValue(wrapper.findAll('option')[0]!.element.value)
    expect(wrapper.emitted('update:modelValue')).toEqual([[null]])
  })
})
