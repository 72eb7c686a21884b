import { expect, it } from 'vitest'
import { methodsAt } from '~~/server/utils/route-match'

const routes = [{ route: '/api/me', method: 'get' }, { route: '/api/me', method: 'patch' }, { route: '/api/campaigns/:slug/recipes', method: 'post' }, { route: '/api/plain' }, { route: '/api/**' }]

it('knows the methods of a plain path and of one with a parameter', () => {
  expect(methodsAt('/api/me', routes)).toEqual(['GET', 'PATCH'])
  expect(methodsAt('/api/campaigns/north/recipes', routes)).toEqual(['POST'])
  expect(methodsAt('/api/plain', routes)).toEqual(['GET'])
})

it('does not take the catch-all, a shorter or a longer path for a route', () => {
  expect(methodsAt('/api/nothing', routes)).toEqual([])
  expect(methodsAt('/api/campaigns/north', routes)).toEqual([])
  expect(methodsAt('/api/me/tokens', routes)).toEqual([])
})
