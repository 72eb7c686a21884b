import { expect, test, type Page } from '@playwright/test'
import { get, maildev, origin, post, recipeFor, signIn } from './helpers'

// Two independent line-by-line readings of this real night sky: 184.9 and 185.5 K with brooke2016, 186.9 and 187.4 K with
// mies1974 (tests/truth/spectra/SOURCE.md). A plausibility check, so 3 K either way.
const readings = { brooke2016: 185.2, mies1974: 187.2 }
const tolerance = 3

interface Mail { id: string, subject: string, text: string, html: string }

async function mailAbout(subjectPart: string): Promise<Mail> {
  let found: Mail | undefined
  await expect.poll(async () => {
    const answer = await fetch(`${maildev}/api/email`).then(response => response.ok ? response : fetch(`${maildev}/email`))
    found = (await answer.json() as Mail[]).filter(mail => `${mail.subject} ${mail.text}`.includes(subjectPart)).at(-1)
    return found !== undefined
  }, { timeout: 90_000, message: `a mail about ${subjectPart}` }).toBe(true)
  return found!
}

async function submitSky(page: Page, campaign: string, recipe: string, name: string): Promise<string> {
  await page.goto(`${origin}/submit?campaign=${campaign}`, { waitUntil: 'networkidle' })
  await page.getByRole('combobox', { name: 'Recipe' }).selectOption(recipe)
  const { readFile } = await import('node:fs/promises')
  await page.locator('input[type=file]').setInputFiles({ name, mimeType: 'application/fits', buffer: await readFile('tests/truth/spectra/nearir_sky_b.fits') })
  const questions = page.getByTestId('questions')
  await expect(questions).toBeVisible()
  await expect(questions.locator('input:checked')).toHaveCount(0)
  await expect(page.getByTestId('queue')).toBeDisabled()
  await questions.getByRole('radio', { name: 'Angstrom' }).check()
  await questions.getByRole('radio', { name: 'vacuum' }).check()
  await questions.getByRole('radio', { name: 'photons' }).check()
  await expect(page.getByTestId('preview').getByTestId('temperature-value')).toBeVisible()
  const preview = await page.getByTestId('preview').getByTestId('temperature-value').innerText()
  await page.getByTestId('queue').click()
  await page.waitForURL(/\/retrievals\/[0-9A-Z]{26}$/)
  return preview.replace(/\s+/g, ' ')
}

/** The number on the page once the page itself has moved to it. */
async function resultOn(page: Page): Promise<{ value: string, uncertainty: string }> {
  const temperature = page.getByTestId('temperature-value')
  await expect(temperature).toBeVisible({ timeout: 60_000 })
  const value = (await temperature.innerText()).match(/([\d.]+)\s*K/)![1]!
  const uncertainty = (await page.getByTestId('temperature-uncertainty').innerText()).match(/± ([\d.]+)/)![1]!
  return { value, uncertainty }
}

for (const [strengthSet, expected] of Object.entries(readings)) {
  test(`a night-sky file becomes a temperature with ${strengthSet}: preview, result, mail, table and CSV agree`, async ({ page }) => {
    test.setTimeout(180_000)
    await signIn(page)
    const stamp = `${strengthSet}-${Date.now()}`
    const { slug } = await post<{ slug: string }>(page.request, '/api/campaigns', { title: `Sky ${stamp}`, kind: 'airglow' })
    const recipe = await post<{ address: string }>(page.request, `/api/campaigns/${slug}/recipes`, { name: `OH(4-2) ${strengthSet}`, settings: recipeFor(strengthSet) })
    const name = `sky-${stamp}.fits`

    const preview = await submitSky(page, slug, recipe.address, name)
    const { value, uncertainty } = await resultOn(page)
    expect(preview).toContain(`${value} K`)
    expect(Math.abs(Number(value) - expected)).toBeLessThanOrEqual(tolerance)
    await expect(page.getByText(`strength set ${strengthSet}`)).toBeVisible()
    await expect(page.getByTestId('provenance')).toContainText('oh-meinel')

    const mail = await mailAbout(name)
    expect(mail.text).toContain(`${value} K`)
    expect(mail.text).toContain(uncertainty)
    expect(mail.html).toContain(value)

    await page.goto(`${origin}/retrievals?campaign=${slug}`)
    const row = page.getByRole('row').filter({ hasText: name })
    await expect(row).toContainText(value)

    const csv = await (await page.request.get(`${origin}/api/exports/retrievals?format=csv&campaign=${slug}`)).text()
    const [header, line] = csv.trim().split(/\r?\n/).filter(text => !text.startsWith('#')) as [string, string]
    const cells = line.split(',').map(cell => cell.replaceAll('"', ''))
    const stored = await get<{ items: { temperature: number }[] }>(page.request, `/api/retrievals?campaign=${slug}`)
    expect(header).toMatch(/temperature/i)
    expect(cells.map(Number)).toContain(stored.items[0]!.temperature)
    expect(stored.items[0]!.temperature.toFixed(value.split('.')[1]?.length ?? 0)).toBe(value)
  })
}

test('a line that is switched off moves the number at once, and can be saved as a revision that says the same', async ({ page }) => {
  test.setTimeout(180_000)
  await signIn(page)
  const { slug } = await post<{ slug: string }>(page.request, '/api/campaigns', { title: `Switch ${Date.now()}`, kind: 'airglow' })
  const recipe = await post<{ address: string }>(page.request, `/api/campaigns/${slug}/recipes`, { name: 'OH(4-2)', settings: recipeFor('brooke2016') })
  await submitSky(page, slug, recipe.address, `switch-${Date.now()}.fits`)
  const stored = await resultOn(page)
  await page.getByTestId('line-table').getByRole('checkbox', { name: 'use line P1(5)' }).first().click()
  await expect(page.getByTestId('switched')).toContainText(`${stored.value} ± ${stored.uncertainty} K →`)
  const moved = await resultOn(page)
  expect(moved.value).not.toBe(stored.value)
  await page.getByRole('button', { name: 'Save as revision' }).click()
  await expect(page.getByText('revision 2', { exact: false }).first()).toBeVisible()
  await expect(page.getByTestId('switched')).toHaveCount(0)
  const saved = await resultOn(page)
  expect(Math.abs(Number(saved.value) - Number(moved.value))).toBeLessThan(0.2)
})

test('a pasted line table is asked for its observable, previewed and queued', async ({ page }) => {
  await signIn(page)
  const { slug } = await post<{ slug: string }>(page.request, '/api/campaigns', { title: `Table ${Date.now()}`, kind: 'airglow' })
  await page.goto(`${origin}/submit?campaign=${slug}`, { waitUntil: 'networkidle' })
  await page.getByRole('tab', { name: 'Line table' }).click()
  await page.getByLabel('Line table', { exact: true }).last().fill('label, intensity, sigma\nP1(2), 812.4, 8\nP1(3), 846.1, 8\nP1(4), 541.0, 8\nP1(5), 246.8, 8')
  await expect(page.getByText('Say what the intensities are.')).toBeVisible()
  await page.getByRole('radio', { name: 'Photons emitted' }).check()
  await page.getByRole('combobox', { name: 'Line list' }).selectOption('oh-meinel')
  await page.getByRole('combobox', { name: 'Band' }).selectOption('3-1')
  await expect(page.getByTestId('preview').getByTestId('temperature-value')).toBeVisible()
  const preview = (await page.getByTestId('preview').getByTestId('temperature-value').innerText()).match(/([\d.]+)\s*K/)![1]!
  await page.getByTestId('queue').click()
  await page.waitForURL(/\/retrievals\/[0-9A-Z]{26}$/)
  expect((await resultOn(page)).value).toBe(preview)
})
