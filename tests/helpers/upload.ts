import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { Account } from './accounts'
import { origin } from './shared-service'

export interface UploadAnswer { status: number, items: UploadItem[], error?: { code: string, fields?: { path: string }[] } }

/** Sends files as a browser does. */
export async function upload({ token }: Account, slug: string, files: { name: string, content: string | Uint8Array<ArrayBuffer> }[], about?: object): Promise<UploadAnswer> {
  const form = new FormData()
  for (const { name, content } of files) form.append('files', new Blob([content]), name)
  if (about) form.append('about', JSON.stringify(about))
  const response = await fetch(`${origin()}/api/campaigns/${slug}/spectra`, { method: 'POST', headers: { authorization: `Bearer ${token}` }, body: form })
  return { status: response.status, ...await response.json() as Omit<UploadAnswer, 'status'> }
}

/** A table of `count` pixels in nm with a bump in its middle; `seed` makes its bytes its own. */
export function spectrumText(count: number, seed = 0): string {
  const rows = ['# invented test data', 'wavelength,flux,sigma']
  for (let i = 0; i < count; i++) rows.push(`${(1500 + i * 0.05).toFixed(3)},${(10 + seed + 50 * Math.exp(-(((i - count / 2) / 4) ** 2))).toFixed(4)},1.5`)
  return rows.join('\n')
}

export const fullAbout = { axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons', columns: { axis: 0, values: 1, sigma: 2 } }
