import { expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { flagNames, observables } from '#shared/engine/types'
import type { LineComponent, LineRetrievalInput, MeasuredLine, NoiseKind } from '#shared/engine/types'
import { notFinite } from '../helpers/all-numbers'
import { seededNormal, seededRandom } from '../helpers/random'

const count = 10_000
const random = seededRandom(20262)
const normal = seededNormal(99)
const pick = <T>(values: readonly T[]) => values[Math.floor(random() * values.length)]
const sometimes = <T>(share: number, odd: () => T, usual: () => T) => random() < share ? odd() : usual()

const odd = () => pick([0, -0, 1, -1, Number.NaN, Infinity, -Infinity, 1e300, -1e300, 1e-300, 5e-324, Number.MAX_VALUE])
const decades = (low: number, high: number) => 10 ** (low + (high - low) * random())

function component(share: number): LineComponent {
  const termLower = sometimes(share, odd, () => decades(-2, 4))
  const wavenumber = sometimes(share, odd, () => decades(-1, 4))
  return {
    wavenumber,
    termLower,
    termUpper: sometimes(share, odd, () => termLower + wavenumber),
    gUpper: sometimes(share, odd, () => 1 + Math.floor(40 * random())),
    gLower: sometimes(share, odd, () => 1 + Math.floor(40 * random())),
    einsteinA: sometimes(share, odd, () => decades(-9, 3)),
    ...(random() < 0.6 ? { raman: { scatteredWavenumber: sometimes(share, odd, () => decades(4, 4.4)), spinWeight: sometimes(share, odd, () => 6), J: Math.floor(12 * random()), branch: pick(['stokes', 'anti-stokes'] as const) } } : {}),
  }
}

function line(i: number, share: number): MeasuredLine {
  const size = decades(-4, 4)
  return {
    label: `L${i}`,
    band: pick(['a', 'a', 'a', 'b', 'c']),
    components: Array.from({ length: sometimes(share, () => 0, () => pick([1, 1, 1, 2, 4])) }, () => component(share)),
    intensity: sometimes(share, odd, () => size * (random() + 0.3 * normal())),
    sigma: sometimes(share, () => pick([null, odd()]), () => size * decades(-4, 0)),
    used: random() < 0.9,
    ...(random() < 0.1 ? { reason: 'set aside' } : {}),
  }
}

function input(): LineRetrievalInput {
  // Half of the inputs are odd in many places, half hardly.
  const share = pick([0, 0.01, 0.2])
  const lines = Array.from({ length: Math.floor(9 * random()) }, (_, i) => line(i, share))
  const n = lines.length
  const covariance = sometimes(0.7, () => undefined, () => Array.from({ length: sometimes(0.1, () => n, () => n * n) }, (_, at) => {
    const diagonal = at % (n + 1) === 0
    return sometimes(share / 10, odd, () => diagonal ? decades(-3, 3) : 0.001 * normal())
  }))
  return {
    reading: {
      observable: pick(observables),
      backgroundTemperature: pick([undefined, 0, 2.725, 50, 300, ...(share ? [Number.NaN, -3, Infinity] : [])]),
      populationPer: pick([undefined, 'level', 'state']),
      widthIn: pick([undefined, 'wavelength', 'wavenumber', 'velocity']),
      signalIn: pick([undefined, 'photons', 'energy']),
    },
    lines,
    covariance,
    noise: pick<NoiseKind>(['absolute', 'relative', 'from-residuals']),
    temperatureRange: sometimes(0.8, () => undefined, () => sometimes(share, () => [odd(), odd()], () => [decades(0, 1.5), decades(2, 4.5)])),
    bandScales: pick([undefined, 'own', 'common']),
    strengthSet: pick([null, 'set']),
    alternatives: random() < 0.3 ? [{ name: 'other', einsteinA: lines.map(l => random() < 0.1 ? null : l.components.map(() => sometimes(share, odd, () => decades(-9, 3)))) }] : undefined,
  }
}

it(`answers ${count} odd inputs without an exception or a number that is not finite, and with a reason wherever it has no temperature`, () => {
  let withTemperature = 0
  const reasons = new Set<string>()
  for (let i = 0; i < count; i++) {
    const given = input()
    const result = retrieveFromLines(given)
    expect(notFinite(result), JSON.stringify(given)).toEqual([])
    expect(result.lines).toHaveLength(given.lines.length)
    expect(result.flags.every(flag => flagNames.includes(flag))).toBe(true)
    if (result.temperature) {
      withTemperature++
      expect(result.reason).toBeUndefined()
      const { value, uNoise, uSystematic, interval68: [low, high] } = result.temperature
      expect(value > 0 && uNoise >= 0 && uSystematic >= 0, JSON.stringify(given)).toBe(true)
      expect((low ?? 0) <= value * (1 + 1e-9) && (high ?? Infinity) >= value * (1 - 1e-9), JSON.stringify(given)).toBe(true)
    }
    else {
      expect(result.reason!.length).toBeGreaterThan(10)
      reasons.add(result.reason!.replace(/[\d.e+]+/g, '#').slice(0, 40))
    }
  }
  // The inputs reach both sides, and many reasons.
  expect(withTemperature).toBeGreaterThan(count / 20)
  expect(reasons.size).toBeGreaterThan(9)
})
