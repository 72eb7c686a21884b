import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import BaseTable from '~/components/base/BaseTable.vue'

const columns = [{ key: 'name', label: 'spectrum', sortable: true }, { key: 'value', label: 'T / K', align: 'end' as const }]
const rows = [{ id: 'a', name: 'one', value: 187.4 }, { id: 'b', name: 'two', value: 190 }]
const table = (props: Record<string, unknown> = {}) =>
  mountSuspended(BaseTable, { props: { caption: 'Retrievals', columns, rows, rowKey: (row: object) => (row as { id: string }).id, ...props } })

describe('BaseTable', () => {
  it('names itself and can be reached by the keyboard, so that it can be scrolled', async () => {
    const region = (await table()).get('[role=region]')
    expect(region.attributes('aria-label')).toBe('Retrievals')
    expect(region.attributes('tabindex')).toBe('0')
  })

  it('says which column is sorted and which way', async () => {
    const wrapper = await table({ sort: '-name' })
    expect(wrapper.findAll('th').map(head => head.attributes('aria-sort'))).toEqual(['descending', undefined])
  })

  it('asks for rising order first and turns it round at the second press', async () => {
    const wrapper = await table()
    await wrapper.get('th button').trigger('click')
    await wrapper.setProps({ sort: 'name' })
    await wrapper.get('th button').trigger('click')
    expect(wrapper.emitted('sort')).toEqual([['name'], ['-name']])
  })

  it('writes the column beside each value, for the stacked records of a narrow screen', async () => {
    const wrapper = await table({ stack: true })
    expect(wrapper.findAll('tbody tr')[0]!.findAll('td').map(cell => [cell.attributes('data-label'), cell.text()])).toEqual([['spectrum', 'one'], ['T / K', '187.4']])
  })
})
