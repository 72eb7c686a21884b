import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it, vi } from 'vitest'
import { defineComponent, h } from 'vue'
import { stationFormSchema, type StationForm, type StationView } from '#shared/schemas/station'
import FormFrame from '~/components/form/FormFrame.vue'
import StationFields from '~/components/station/StationFields.vue'
import { ApiError } from '~/utils/api-error'
import { emptyStation, stationFields, stationForm } from '~/utils/objects/station-fields'

const ridge: StationView = { id: 'S', slug: 'ridge', name: 'Ridge', latitude: 61, longitude: 9, altitude: null, archivedAt: null, createdAt: '2026-01-01T00:00:00.000Z', version: 3 }
type Save = (values: StationForm, version: number) => Promise<unknown>

async function mountForm(save: Save, station?: StationView) {
  const Host = defineComponent({
    setup() {
      const form = useEditForm({ schema: stationFormSchema, fields: stationFields, initial: station ? stationForm(station) : emptyStation(), version: station?.version, save, fromCurrent: (current: StationView) => stationForm(current) })
      return () => h(FormFrame, { form: form as never, save: 'Save', cancelTo: '/' }, { default: () => h(StationFields, { 'modelValue': form.values, 'problem': form.problem, 'onUpdate:modelValue': () => {} }) })
    },
  })
  const wrapper = await mountSuspended(Host)
  const input = (label: string) => wrapper.find(`[id="${wrapper.findAll('label').find(item => item.text().startsWith(label))!.attributes('for')}"]`)
  const alerts = () => wrapper.findAll('[role=alert]').map(alert => alert.text().replace('▲', ''))
  const submit = async () => {
    await wrapper.get('form').trigger('submit')
    await vi.waitFor(() => expect(wrapper.find('[aria-busy]').exists()).toBe(false))
    await nextTick()
  }
  return { wrapper, input, alerts, submit }
}
const stale = (current: object) => new ApiError('stale_version', 'Somebody changed this station.', 409, [], current)

describe('a form', () => {
  it('says nothing before one types, and speaks beside the field while one does', async () => {
    const { input, alerts } = await mountForm(vi.fn())
    expect(alerts()).toEqual([])
    await input('Latitude').setValue('91')
    expect(alerts()).toEqual(['A latitude is between -90 and 90 degrees; south is negative.', 'State latitude and longitude both, or neither.'])
    expect(input('Latitude').attributes('aria-invalid')).toBe('true')
    await input('Latitude').setValue('nine')
    expect(alerts()[0]).toBe('Enter a number, with a point for decimals.')
    await input('Latitude').setValue('')
    expect(alerts()).toEqual([])
  })

  it('is not sent while something is wrong: all of it is said, and the first field has the focus', async () => {
    const save = vi.fn()
    const { wrapper, input, alerts, submit } = await mountForm(save)
    document.body.append(wrapper.element)
    await submit()
    expect([save.mock.calls.length, alerts()]).toEqual([0, ['The name is needed.', 'Enter an address, for example hollow-ridge.']])
    expect(wrapper.text()).toContain('2 entries to mend.')
    expect(document.activeElement).toBe(input('Name').element)
  })

  it('is sent with checked values and the version that was read', async () => {
    const save = vi.fn(async () => {})
    const { input, submit } = await mountForm(save, ridge)
    await input('Name').setValue('  New name ')
    await submit()
    expect(save.mock.calls).toEqual([[{ ...stationForm(ridge), name: 'New name' }, 3]])
  })

  it('shows the server\'s word beside the field until that field is changed', async () => {
    const { input, alerts, submit } = await mountForm(async () => { throw new ApiError('conflict', 'Taken.', 409, [{ path: 'slug', message: 'This address is taken.' }]) })
    await input('Name').setValue('Ridge')
    await input('Address').setValue('ridge')
    await submit()
    expect(alerts()).toEqual(['This address is taken.'])
    await input('Address').setValue('ridge-2')
    expect(alerts()).toEqual([])
  })

  it('says above the fields what belongs to none of them', async () => {
    const { alerts, input, submit, wrapper } = await mountForm(async () => { throw new ApiError('archived', 'The campaign is archived.', 409) }, ridge)
    await input('Name').setValue('Other')
    await submit()
    expect(alerts()).toEqual(['The campaign is archived.'])
    expect(wrapper.text()).toContain('Not saved yet.')
  })
})

describe('a form whose row somebody else changed', () => {
  const theirs = { ...ridge, name: 'Their name', altitude: 1130, version: 4 }

  it('shows both sides, keeps what is chosen field by field, and is sent again on the newest version', async () => {
    const save = vi.fn<Save>().mockRejectedValueOnce(stale(theirs)).mockResolvedValueOnce(null)
    const { wrapper, input, submit } = await mountForm(save, ridge)
    await input('Name').setValue('My name')
    await input('Latitude').setValue('62')
    await submit()
    const conflict = wrapper.get('[data-testid=conflict]')
    expect(conflict.findAll('legend').map(legend => legend.text())).toEqual(['Name · changed by both of you', 'Latitude', 'Altitude'])
    expect(conflict.text()).toContain('My name')
    expect(conflict.text()).toContain('Their name')
    expect(wrapper.get('button[type=submit]').attributes('disabled')).toBeDefined()
    await conflict.get('input[name=keep-name][value=now]').setValue()
    await conflict.get('button').trigger('click')
    await vi.waitFor(() => expect(save).toHaveBeenCalledTimes(2))
    expect(save.mock.calls[1]).toEqual([{ slug: 'ridge', name: 'Their name', latitude: 62, longitude: 9, altitude: 1130 }, 4])
    expect(wrapper.find('[data-testid=conflict]').exists()).toBe(false)
  })

  it('asks again when a third state came in the meantime', async () => {
    const save = vi.fn<Save>().mockRejectedValueOnce(stale(theirs)).mockRejectedValueOnce(stale({ ...theirs, longitude: 10, version: 5 })).mockResolvedValueOnce(null)
    const { wrapper, input, submit } = await mountForm(save, ridge)
    await input('Name').setValue('My name')
    await submit()
    await wrapper.get('[data-testid=conflict] button').trigger('click')
    await vi.waitFor(() => expect(wrapper.findAll('[data-testid=conflict] legend').map(legend => legend.text())).toEqual(['Name', 'Longitude']))
    await wrapper.get('[data-testid=conflict] button').trigger('click')
    await vi.waitFor(() => expect(save).toHaveBeenCalledTimes(3))
    expect(save.mock.calls[2]).toEqual([{ slug: 'ridge', name: 'My name', latitude: 61, longitude: 10, altitude: 1130 }, 5])
  })
})

describe('the address of a new thing', () => {
  const values = () => reactive({ name: '', slug: '' })
  const host = (form: { name: string, slug: string }) => mountSuspended(defineComponent({ setup() { useSlugFromName(form, 'name', 'station'); return () => h('p') } }))

  it('follows the name until somebody writes one', async () => {
    const form = values()
    await host(form)
    for (const [name, slug] of [['Hollow', 'hollow'], ['Hollow Ridge', 'hollow-ridge'], ['🔭', 'station'], ['', '']] as const) {
      form.name = name
      await nextTick()
      expect(form.slug).toBe(slug)
    }
    form.name = 'Quiet Hill'
    await nextTick()
    form.slug = 'qh'
    form.name = 'Quiet Hills'
    await nextTick()
    expect(form.slug).toBe('qh')
  })
})
