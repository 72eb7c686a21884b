import { expect, it } from 'vitest'
import { onStop, runStopStage, stopEverything } from '~~/server/lifecycle'

it('ends streams before workers, workers before the queue, and the database last, each once', async () => {
  const ended: string[] = []
  for (const stage of ['database', 'queue', 'streams', 'workers'] as const) onStop(stage, stage, () => ended.push(stage))
  await runStopStage('streams')
  await stopEverything()
  await stopEverything()
  expect(ended).toEqual(['streams', 'workers', 'queue', 'database'])
})

it('a part that cannot stop does not keep the others from stopping', async () => {
  const ended: string[] = []
  onStop('queue', 'broken', () => Promise.reject(new Error('stuck')))
  onStop('database', 'database', () => ended.push('database'))
  await stopEverything()
  expect(ended).toEqual(['database'])
})
