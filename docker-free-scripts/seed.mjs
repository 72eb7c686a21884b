// Fills an empty service with the invented demo, through the real API and queue:
//   npm run seed -- --demo            accounts, campaigns, spectra, retrievals
//   npm run seed -- --accounts-only   the five demo accounts alone
// A second run adds nothing.
import { addAirglowCampaign, slug as airglow, submitNights } from './demo/airglow.mjs'
import { addAccounts, addMembers, withToken } from './demo/accounts.mjs'
import { createClient } from './demo/client.mjs'
import { addCloudCampaign, slug as cloud, submitPointings } from './demo/cloud.mjs'
import { runScript, withDatabase } from './lib/database.mjs'
import { setting } from './lib/environment.mjs'

const origin = setting('TROTLINE_ORIGIN')

async function seedDemo(connection) {
  const done = await withToken(connection, 'lead@trotline.example', async (token) => {
    const lead = createClient(origin, token)
    await addAirglowCampaign(lead)
    await addCloudCampaign(lead)
    for (const slug of [airglow, cloud]) await addMembers(connection, (await lead.get(`/api/campaigns/${slug}`)).id)
    // The last that is submitted is there: a run before this one came to its end.
    return (await lead.get(`/api/retrievals?campaign=${cloud}&q=pointing%2012&limit=1`)).total > 0
  })
  if (done) return console.log('The demo is there already.')
  await withToken(connection, 'observer@trotline.example', async (token) => {
    const observer = createClient(origin, token)
    await submitNights(observer)
    await submitPointings(observer)
  })
  console.log('The demo is queued.')
}

await runScript(async () => {
  const [what] = process.argv.slice(2)
  if (!['--demo', '--accounts-only'].includes(what)) throw new Error('Usage: npm run seed -- --demo | --accounts-only')
  await withDatabase(async (connection) => {
    await addAccounts(connection)
    if (what === '--demo') await seedDemo(connection)
  })
})
