import { describe, expect, it } from 'vitest'
import { campaignActions, campaignRoles } from '#shared/types/roles'
import { may } from '#shared/utils/permissions'
import { mayIn } from '#shared/utils/permissions-in-archive'

describe('an archived campaign', () => {
  it('never allows what the role does not', () => {
    for (const role of campaignRoles) for (const action of campaignActions) {
      if (mayIn({ role, archivedAt: '2026-01-14T00:00:00.000Z' }, action)) expect([role, action, may(role, action)]).toEqual([role, action, true])
      expect(mayIn({ role, archivedAt: null }, action)).toBe(may(role, action))
    }
  })

  it('is read, left, stopped and brought back, and nothing is added or changed', () => {
    const allowed = campaignActions.filter(action => mayIn({ role: 'lead', archivedAt: new Date() }, action))
    expect(allowed).toEqual(['see', 'export', 'abort-own', 'abort-any', 'manage-members', 'release', 'archive'])
  })

  it('that is not there allows nothing', () => expect(mayIn(null, 'see')).toBe(false))
})
