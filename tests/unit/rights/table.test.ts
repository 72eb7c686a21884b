import { describe, expect, it } from 'vitest'
import { campaignActions, campaignRoles, serviceActions } from '#shared/types/roles'
import { allowedActions, isDoorRight, may, mayOnService } from '#shared/utils/permissions'

describe('rights inside a campaign', () => {
  it('each role may all that the one below it may, and more', () => {
    const counts = campaignRoles.map(role => allowedActions[role].length)
    expect(counts).toEqual([...new Set(counts)].sort((a, b) => a - b))
    for (const [below, above] of [['reader', 'observer'], ['observer', 'analyst'], ['analyst', 'lead']] as const) {
      expect(allowedActions[above]).toEqual(expect.arrayContaining([...allowedActions[below]]))
    }
  })

  it('a reader changes nothing, a lead may everything, and who is no member may nothing', () => {
    expect(allowedActions.reader).toEqual(['see', 'export'])
    expect([...allowedActions.lead].sort()).toEqual([...campaignActions].sort())
    for (const action of campaignActions) expect([action, may(null, action)]).toEqual([action, false])
  })

  it('observers leave alone what others submitted; members and archive are the lead\'s', () => {
    expect(['abort-any', 'revise-any', 'review'].filter(action => may('observer', action as never))).toEqual([])
    expect((['manage-members', 'archive', 'edit-campaign', 'release'] as const).filter(action => may('analyst', action))).toEqual([])
  })
})

describe('rights outside campaigns', () => {
  const person = { isAdministrator: false, via: 'session' } as const
  const administrator = { isAdministrator: true, via: 'session' } as const
  const rightsOf = (caller: Parameters<typeof mayOnService>[0]) => (['anyone', 'account', 'page', ...serviceActions] as const).filter(right => mayOnService(caller, right))

  it('a visitor may what anyone may', () => expect(rightsOf(null)).toEqual(['anyone']))
  it('an account may more on a page than by token', () => {
    expect(rightsOf(person)).toEqual(['anyone', 'account', 'page'])
    expect(rightsOf({ ...person, via: 'token' })).toEqual(['anyone', 'account'])
  })
  it('an administrator\'s token administers nothing', () => {
    expect(rightsOf(administrator)).toEqual(['anyone', 'account', 'page', ...serviceActions])
    expect(rightsOf({ ...administrator, via: 'token' })).toEqual(['anyone', 'account'])
  })
  it('only rights that need no campaign are checked at the door', () => {
    expect([isDoorRight('page'), isDoorRight('manage-queue'), isDoorRight('account'), isDoorRight('review')]).toEqual([true, true, false, false])
  })
})
