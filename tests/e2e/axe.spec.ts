import AxeBuilder from '@axe-core/playwright'
import { expect, test, type Page } from '@playwright/test'
import { get, origin, signIn } from './helpers'

const themes = ['day', 'night', 'dome'] as const
interface Rows { items: { id: string, batchId: string }[] }

const campaignPages = {
  'campaign': '', 'stations': '?tab=stations', 'instruments': '?tab=instruments', 'recipes': '?tab=recipes', 'members': '?tab=members', 'campaign logbook': '?tab=logbook', 'campaign settings': '/settings',
  'station': '/stations/hollow-ridge', 'new station': '/stations/new', 'change of a station': '/stations/hollow-ridge/edit',
  'instrument': '/instruments/hollow-ridge-grating', 'new instrument': '/instruments/new',
  'recipe': '/recipes/oh-3-1', 'new recipe': '/recipes/new', 'comparison of recipes': '/recipes/compare?a=oh-3-1@1&b=oh-4-2@1',
}

async function pagesToCheck(page: Page): Promise<Record<string, string>> {
  const one = async (query: string) => (await get<Rows>(page.request, `/api/retrievals?limit=1&${query}`)).items[0]!
  const done = await one('phase=COMPLETED&campaign=hollow-ridge-winter-nights')
  const failed = await one('phase=ERROR')
  const held = (await get<Rows>(page.request, '/api/retrievals?limit=1&phase=HELD')).items[0]
  return {
    'desk': '/', 'campaigns': '/campaigns', 'new campaign': '/campaigns/new',
    ...Object.fromEntries(Object.entries(campaignPages).map(([name, path]) => [name, `/campaigns/hollow-ridge-winter-nights${path}`])),
    'submit': '/submit', 'retrievals': '/retrievals', 'result done': `/retrievals/${done.id}`, 'result failed': `/retrievals/${failed.id}`,
    ...(held ? { 'result held': `/retrievals/${held.id}` } : {}),
    'batch': `/batches/${done.batchId}`, 'line lists': '/line-lists', 'line list': '/line-lists/oh-meinel', 'account': '/account', 'error page': '/retrievals/01ARZ3NDEKTSV4RRFFQ69G5FAV',
  }
}

async function violationsOf(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']).analyze()
  return violations.flatMap(({ id, help, nodes }) => nodes.map(node => `${id}: ${help}: ${node.target.join(' ')}: ${node.failureSummary?.split('\n').slice(1, 3).join(' ').trim() ?? ''}`))
}

const settle = async (page: Page) => {
  await page.waitForLoadState('networkidle').catch(() => {})
  await page.waitForTimeout(300)
}

async function checkAll(page: Page, pages: Record<string, string>, look: string): Promise<void> {
  for (const [name, path] of Object.entries(pages)) {
    await page.goto(`${origin}${path}`)
    await settle(page)
    expect.soft(await violationsOf(page), `${name}, ${look}`).toEqual([])
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)
    expect.soft(overflow, `${name}, ${look}: nothing runs out of the page sideways`).toBeLessThanOrEqual(0)
  }
}

const wear = (page: Page, theme: string) => page.context().addCookies([{ name: 'trotline-theme', value: theme, url: origin }])

for (const theme of themes) {
  test(`no page violates WCAG in the ${theme} theme at 1440 pixels`, async ({ page }) => {
    test.setTimeout(240_000)
    await wear(page, theme)
    await page.goto(`${origin}/sign-in`)
    await settle(page)
    expect.soft(await violationsOf(page), `sign-in, ${theme}`).toEqual([])
    await signIn(page)
    await expect(page.locator('html')).toHaveAttribute('data-theme', theme)
    await checkAll(page, await pagesToCheck(page), theme)
  })
}

test('no page violates WCAG at 390 pixels', async ({ page }) => {
  test.setTimeout(240_000)
  await page.setViewportSize({ width: 390, height: 844 })
  await signIn(page)
  await checkAll(page, await pagesToCheck(page), '390 pixels')
})

test('a file that asks questions and shows its preview violates nothing in any theme', async ({ page }) => {
  await signIn(page)
  for (const theme of themes) {
    await wear(page, theme)
    await page.goto(`${origin}/submit?campaign=hollow-ridge-winter-nights`)
    await page.getByRole('combobox', { name: 'Recipe' }).selectOption({ index: 2 })
    await page.locator('input[type=file]').setInputFiles('tests/truth/spectra/nearir_sky_b.fits')
    await page.getByTestId('questions').getByRole('radio', { name: 'air' }).check()
    await settle(page)
    expect.soft(await violationsOf(page), `submit with a file, ${theme}`).toEqual([])
  }
})
