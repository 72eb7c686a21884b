import { expect, it } from 'vitest'
import { erf } from '#shared/engine/spectrum/erf'
import { runPython } from '../../truth/python/run-python'

it('erf is that of scipy.special within 1e-15 from -7 to 7', () => {
  const points = [...Array.from({ length: 561 }, (_, i) => -7 + i / 40), 1e-300, -1e-9, 0.84375, 1.25, 1 / 0.35, 6, 1e9]
  const expected = runPython<number[]>('special_functions.py', points.map(x => ['erf', [x]]))
  points.forEach((x, i) => expect(Math.abs(erf(x) - expected[i]), `erf(${x})`).toBeLessThanOrEqual(1e-15))
})
