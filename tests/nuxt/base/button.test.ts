import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import BaseButton from '~/components/base/BaseButton.vue'

describe('BaseButton', () => {
  it('does not send a form unless it is told to', async () => {
    expect((await mountSuspended(BaseButton)).get('button').attributes('type')).toBe('button')
    expect((await mountSuspended(BaseButton, { props: { type: 'submit' } })).get('button').attributes('type')).toBe('submit')
  })

  it('is a link to a page of ours', async () => {
    expect((await mountSuspended(BaseButton, { props: { to: '/submit' } })).get('a').attributes('href')).toBe('/submit')
  })

  it('keeps the focus while it works, says so, and does not send the form twice', async () => {
    const button = (await mountSuspended(BaseButton, { props: { busy: true, type: 'submit' }, slots: { default: () => 'Save' } })).get('button')
    expect(button.attributes('disabled')).toBeUndefined()
    expect(button.attributes('aria-busy')).toBe('true')
    expect(button.attributes('type')).toBe('button')
    expect(button.text()).toContain('working')
  })
})
