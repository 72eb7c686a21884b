import { getHeader } from 'h3'
import { campaignParams } from '#shared/schemas/campaign'
import { campaignFor } from '../../../services/campaigns/access'
import { storeFiles, storeJson } from '../../../services/spectra/store-spectrum'
import { isJsonType, readBytes } from '../../../utils/read-json'
import { withForm } from '../../../utils/receive-form'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: campaignParams, status: 207 }, async ({ event, actor, params: { slug } }) => {
  // Whoever may not upload here is told before a byte is read.
  await campaignFor(actor, slug, 'upload')
  if (isJsonType(getHeader(event, 'content-type'))) return { items: await storeJson(actor, slug, await readBytes(event)) }
  return withForm(event, {}, async ({ files, about }) => ({ items: await storeFiles(actor, slug, files, about) }))
})
