import * as z from 'zod'
import { campaignParams } from '#shared/schemas/campaign'
import { pageSchema } from '#shared/schemas/paging'
import { jsonSpectrumSchema, spectrumAboutSchema } from '#shared/schemas/spectrum'
import { spectraQuerySchema, spectrumDataQuerySchema, spectrumDataSchema, spectrumParams, spectrumPatchSchema, spectrumViewSchema, uploadAnswerSchema, versionQuerySchema } from '#shared/schemas/spectrum-view'
import type { ApiRoute } from './types'

const uploadForm = z.object({
  files: z.array(z.string().meta({ contentMediaType: 'application/octet-stream' })).describe('The files; the part is repeated.'),
  about: spectrumAboutSchema.optional().describe('JSON that holds for all files of the form.'),
})

const mendForm = z.object({
  files: z.string().meta({ contentMediaType: 'application/octet-stream' }).describe('The mended file.'),
  about: spectrumAboutSchema.optional().describe('JSON; what is left out stays as it was said of the file before.'),
})

const ofOne = { area: 'spectra', params: spectrumParams } as const

export const spectrumRoutes: ApiRoute[] = [
  {
    method: 'get', path: '/api/campaigns/{slug}/spectra', area: 'spectra', access: 'read', who: 'see', summary: 'The spectra of a campaign; with problem=true the files that cannot be read and wait to be mended.', params: campaignParams, query: spectraQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(spectrumViewSchema) } },
  },
  {
    method: 'post', path: '/api/campaigns/{slug}/spectra', area: 'spectra', access: 'submit', who: 'upload', summary: 'Upload spectra; each file has its own answer, the same bytes twice are the same spectrum, and a file that cannot be read is kept to be mended.', params: campaignParams,
    bodies: { 'multipart/form-data': uploadForm, 'application/json': jsonSpectrumSchema },
    answers: { 207: { description: 'One item a file, in their order.', schema: uploadAnswerSchema } },
  },
  {
    ...ofOne, method: 'get', path: '/api/spectra/{id}', access: 'read', who: 'see', summary: 'One spectrum: what is known of it and what is missing.',
    answers: { 200: { description: 'The spectrum.', schema: spectrumViewSchema } },
  },
  {
    ...ofOne, method: 'patch', path: '/api/spectra/{id}', access: 'submit', who: 'upload', whoForOthers: 'revise-any', summary: 'Say more about a spectrum.', body: spectrumPatchSchema,
    answers: { 200: { description: 'The spectrum as it stands now.', schema: spectrumViewSchema } },
    errors: [409],
  },
  {
    ...ofOne, method: 'get', path: '/api/spectra/{id}/data', access: 'read', who: 'see', summary: 'Its numbers, thinned for a plot with highs and lows kept.', query: spectrumDataQuerySchema,
    answers: { 200: { description: 'In the unit and the order of the file.', schema: spectrumDataSchema } },
  },
  {
    ...ofOne, method: 'get', path: '/api/spectra/{id}/bytes', access: 'read', who: 'see', summary: 'The bytes as they were uploaded.',
    answers: { 200: { description: 'The original file.', type: 'application/octet-stream' } },
  },
  {
    ...ofOne, method: 'put', path: '/api/spectra/{id}/bytes', access: 'submit', who: 'upload', whoForOthers: 'revise-any', summary: 'Put a mended file in the place of one that cannot be read.', query: versionQuerySchema,
    bodies: { 'multipart/form-data': mendForm },
    answers: { 200: { description: 'The spectrum as it stands now.', schema: spectrumViewSchema } },
    errors: [409, 413, 415],
  },
  {
    ...ofOne, method: 'delete', path: '/api/spectra/{id}', access: 'submit', who: 'upload', whoForOthers: 'revise-any', summary: 'Delete a file that cannot be read.', query: versionQuerySchema,
    answers: { 204: { description: 'It is gone.' } },
    errors: [409],
  },
]
