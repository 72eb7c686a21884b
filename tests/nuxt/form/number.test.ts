import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseNumber from '~/components/base/BaseNumber.vue'

const typed = async (text: string) => {
  const wrapper = await mountSuspended(BaseNumber, { props: { modelValue: 5 } })
  await wrapper.get('input').setValue(text)
  return wrapper.emitted('update:modelValue')!.at(-1)![0]
}

it.each([['61.42', 61.42], ['-3', -3], ['−3', -3], [' 7 ', 7], ['', null], ['1e3', 1000], ['61,42', Number.NaN], ['nine', Number.NaN]])('a field of numbers takes "%s" for %s', async (text, value) => {
  expect(await typed(text)).toBe(value)
})

it('what is being typed stays as it is typed; what comes from elsewhere is shown', async () => {
  const wrapper = await mountSuspended(BaseNumber, { props: { modelValue: 1 as number | null } })
  const input = wrapper.get('input')
  await input.setValue('1.50')
  await wrapper.setProps({ modelValue: 1.5 })
  expect(input.element.value).toBe('1.50')
  await wrapper.setProps({ modelValue: 2 })
  expect(input.element.value).toBe('2')
  await wrapper.setProps({ modelValue: null })
  expect(input.element.value).toBe('')
})
