import { expect, type APIRequestContext, type Page } from '@playwright/test'

export const origin = process.env.TROTLINE_TEST_ORIGIN ?? 'http://127.0.0.1:4310'
export const maildev = process.env.TROTLINE_TEST_MAILDEV_URL ?? 'http://127.0.0.1:4314'

export async function signIn(page: Page, email = 'lead@trotline.example'): Promise<void> {
  await page.goto(`${origin}/sign-in`)
  await page.getByLabel(/e-?mail/i).fill(email)
  await page.getByLabel(/password/i).fill('trotline-demo')
  await page.getByRole('button', { name: /sign in/i }).click()
  await page.waitForURL(url => !url.pathname.startsWith('/sign-in'))
}

/** A change by the signed-in browser session; its origin is our own. */
export async function post<T>(request: APIRequestContext, path: string, data: object): Promise<T> {
  const response = await request.post(`${origin}${path}`, { data, headers: { origin } })
  expect(response.ok(), `${path}: ${response.status()} ${await response.text()}`).toBe(true)
  return await response.json() as T
}

export async function get<T>(request: APIRequestContext, path: string): Promise<T> {
  const response = await request.get(`${origin}${path}`)
  expect(response.ok(), `${path}: ${response.status()}`).toBe(true)
  return await response.json() as T
}

export const recipeFor = (strengthSet: string) => ({
  observable: 'photon-emission', lineList: 'oh-meinel', bands: ['4-2'], lines: ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)'], strengthSet, noise: 'from-residuals',
})
