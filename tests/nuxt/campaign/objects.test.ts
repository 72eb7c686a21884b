import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it, vi } from 'vitest'
import type { LogbookView } from '#shared/schemas/logbook'
import type { RecipeView } from '#shared/schemas/recipe'
import { settingsSchema } from '#shared/schemas/settings'
import ArchiveAction from '~/components/campaign/ArchiveAction.vue'
import CampaignRecipes from '~/components/campaign/CampaignRecipes.vue'
import LogbookList from '~/components/logbook/LogbookList.vue'
import RecipeDifferences from '~/components/recipe/RecipeDifferences.vue'
import StationGlobe from '~/components/station/StationGlobe.vue'

const recipe = (version: number, change: Partial<RecipeView> = {}): RecipeView => ({
  id: `R${version}`, address: `oh@${version}`, slug: 'oh', version, name: 'OH', settings: settingsSchema.parse({ lineList: 'oh-meinel', bands: [`${version}-1`] }), createdBy: 'Ada', createdAt: '2026-01-14T00:00:00.000Z', newest: version === 2, archivedAt: null, ...change,
})

describe('recipes of a campaign', () => {
  const mount = (recipes: RecipeView[], mayEdit = true) => mountSuspended(CampaignRecipes, { props: { recipes, slug: 'winter', mayEdit } })
  const links = (wrapper: Awaited<ReturnType<typeof mount>>) => wrapper.findAll('tbody a').map(link => link.attributes('href'))

  it('are their newest versions; earlier and archived ones are shown when they are asked for', async () => {
    const wrapper = await mount([recipe(1), recipe(2), recipe(3, { slug: 'old', address: 'old@1', newest: true, archivedAt: '2026-02-01T00:00:00.000Z' })])
    expect(links(wrapper)).toEqual(['/campaigns/winter/recipes/oh@2'])
    await wrapper.findAll('input[type=checkbox]')[0]!.setValue(true)
    expect(links(wrapper)).toHaveLength(2)
    await wrapper.findAll('input[type=checkbox]')[1]!.setValue(true)
    expect(links(wrapper)).toHaveLength(3)
    expect(wrapper.text()).toContain('archived')
  })

  it('are added by those who may', async () => {
    expect((await mount([recipe(2)])).text()).toContain('New recipe')
    expect((await mount([recipe(2)], false)).text()).not.toContain('New recipe')
  })
})

describe('two recipes side by side', () => {
  it('show only what differs', async () => {
    const wrapper = await mountSuspended(RecipeDifferences, { props: { left: recipe(1), right: recipe(2) } })
    expect(wrapper.findAll('th').map(cell => cell.text())).toEqual(['setting', 'oh@1', 'oh@2'])
    expect(wrapper.findAll('tbody tr').map(row => row.findAll('td').map(cell => cell.text()))).toEqual([['Bands', '1-1', '2-1']])
  })
  it('say so when nothing does', async () => {
    expect((await mountSuspended(RecipeDifferences, { props: { left: recipe(1), right: { ...recipe(1), address: 'oh@5' } } })).text()).toBe('The two are the same in every setting.')
  })
})

describe('archiving', () => {
  it('asks first, and brings back at once', async () => {
    const run = vi.fn(async () => {})
    const props = { noun: 'station', consequence: 'Nothing is submitted at it.', run }
    const archiving = await mountSuspended(ArchiveAction, { props: { ...props, archivedAt: null } })
    await archiving.get('button').trigger('click')
    expect(run).not.toHaveBeenCalled()
    expect(document.body.textContent).toContain('Archive this station?')
    const confirm = [...document.querySelectorAll('button')].find(button => button.textContent?.includes('Archive the station'))!
    confirm.click()
    await vi.waitFor(() => expect(run).toHaveBeenCalledWith(true))
    const back = await mountSuspended(ArchiveAction, { props: { ...props, archivedAt: '2026-01-14T00:00:00.000Z' } })
    await back.get('button').trigger('click')
    expect(run).toHaveBeenLastCalledWith(false)
  })

  it('says why it was refused', async () => {
    const wrapper = await mountSuspended(ArchiveAction, { props: { noun: 'station', consequence: '', archivedAt: '2026-01-14T00:00:00.000Z', run: () => Promise.reject(new Error('no')) } })
    await wrapper.get('button').trigger('click')
    await vi.waitFor(() => expect(wrapper.find('[role=alert]').exists()).toBe(true))
  })
})

describe('the logbook', () => {
  const entry: LogbookView = { id: '1', at: '2026-01-14T21:40:00.000Z', actor: '\u200Fלאה', action: 'change', detail: { name: { from: '<b>Old</b>', to: 'x'.repeat(400) } }, object: { kind: 'station', id: 'S', name: '“Quiet” 🔭', address: 'quiet' } }

  it('names the thing in a campaign\'s, with its page, and says "it" in its own', async () => {
    const inCampaign = await mountSuspended(LogbookList, { props: { entries: [entry], campaign: 'winter' } })
    expect(inCampaign.text().replace(/\s+/g, ' ')).toContain('changed the station “Quiet” 🔭')
    expect(inCampaign.get('a').attributes('href')).toBe('/campaigns/winter/stations/quiet')
    const own = await mountSuspended(LogbookList, { props: { entries: [entry], about: 'thing' } })
    expect(own.text()).toContain('changed it')
    expect(own.find('a').exists()).toBe(false)
  })

  it('folds long texts away, and shows markup as the text that it is', async () => {
    const wrapper = await mountSuspended(LogbookList, { props: { entries: [entry], about: 'thing' } })
    expect(wrapper.get('summary').text()).toBe('Name: 10 characters before, 400 characters now')
    expect(wrapper.get('details').text()).toContain('<b>Old</b>')
  })

  it('says that nothing is written yet', async () => {
    expect((await mountSuspended(LogbookList, { props: { entries: [] } })).text()).toBe('Nothing is written here yet.')
  })
})

it('the globe says in words where the station is', async () => {
  expect((await mountSuspended(StationGlobe, { props: { latitude: -31.2, longitude: 342.5 } })).get('svg').attributes('aria-label')).toBe('A globe with the station at 31.200° S, 17.500° W')
})
