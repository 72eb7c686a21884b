import { mockNuxtImport, mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { reactive } from 'vue'
import LayoutThemeSwitch from '~/components/layout/LayoutThemeSwitch.vue'
import PageHeader from '~/components/layout/PageHeader.vue'

// The cookie behind it belongs to the browser; what is tried here is the switch.
mockNuxtImport('useColorMode', () => {
  const mode = reactive({ preference: 'day', value: 'day' })
  return () => mode
})

describe('PageHeader', () => {
  it('carries the one h1 of the page and the way back', async () => {
    const header = await mountSuspended(PageHeader, { props: { title: 'New recipe', crumbs: [{ label: 'Campaigns', to: '/campaigns' }, { label: 'Quiet Cloud' }] } })
    expect(header.findAll('h1').map(title => title.text())).toEqual(['New recipe'])
    expect(header.get('nav[aria-label=Breadcrumb] a').attributes('href')).toBe('/campaigns')
  })
})

describe('LayoutThemeSwitch', () => {
  it('presses exactly the theme that is on, and takes another at a press', async () => {
    const wrapper = await mountSuspended(LayoutThemeSwitch)
    const pressed = () => wrapper.findAll('button').filter(button => button.attributes('aria-pressed') === 'true').map(button => button.attributes('aria-label'))
    await wrapper.get('[aria-label="Dome theme"]').trigger('click')
    expect(pressed()).toEqual(['Dome theme'])
    await wrapper.get('[aria-label="Day theme"]').trigger('click')
    expect(pressed()).toEqual(['Day theme'])
  })
})
