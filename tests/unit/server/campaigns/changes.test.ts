import { describe, expect, it } from 'vitest'
import { changesBetween } from '../../../../server/services/campaigns/changes'

describe('what the logbook says of a change', () => {
  it('names each field that differs, from what to what', () => {
    expect(changesBetween({ title: 'Old', kind: 'comet', tags: [1, 2] }, { title: 'New', kind: 'comet', tags: [2, 1] })).toEqual({
      title: { from: 'Old', to: 'New' },
      tags: { from: [1, 2], to: [2, 1] },
    })
  })

  it('is silent about what was not sent', () => {
    expect(changesBetween({ title: 'Old', description: 'x' }, { title: undefined })).toEqual({})
  })
})
