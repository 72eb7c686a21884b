import { describe, expect, it } from 'vitest'
import { nistNames, readNistDataset } from './nist-strd/dataset'
import { linearNames, readLinearDataset } from './nist-strd/linear'
import { nistModels } from './nist-strd/models'
import { correctDigits, fewestDigits } from './validation/digits'
import { exactLeastSquares, fromDecimal, over, toNumber } from './validation/rational'
import { compareLinear } from './validation/sections/nist-linear'
import { fitNist } from './validation/sections/nist-nonlinear'

describe.each(nistNames)('the model of %s', (name) => {
  const dataset = readNistDataset(name)
  const model = nistModels[name]

  it('has the certified sum of squares at the certified parameters', () => {
    const b = Float64Array.from(dataset.certified.parameters)
    const sum = dataset.y.reduce((total, y, i) => total + (model.value(b, dataset.x[i]) - (model.response?.(y) ?? y)) ** 2, 0)
    // Lanczos2 leaves 2e-11: eleven digits of the parameters do not determine it further.
    expect(correctDigits(sum, dataset.certified.sumOfSquares)).toBeGreaterThan(name.startsWith('Lanczos') ? 5 : 9)
  })

  it('has derivatives that differences confirm', () => {
    const b = Float64Array.from(dataset.certified.parameters)
    const x = dataset.x[Math.floor(dataset.x.length / 2)]
    model.gradient(b, x).forEach((slope, j) => {
      const h = 1e-5 * Math.abs(b[j])
      const at = (p: number) => model.value(b.map((value, k) => k === j ? p : value), x)
      const difference = (at(b[j] + h) - at(b[j] - h)) / (2 * h)
      expect(Math.abs(difference - slope)).toBeLessThan(1e-6 * Math.abs(slope) + 1e-9 * Math.abs(at(b[j]) / b[j]))
    })
  })

  it('is fitted with the certified degrees of freedom and residual standard deviation', () => {
    const fit = fitNist(dataset, 1, 'analytic')
    expect(fit.dof).toBe(dataset.certified.dof)
    expect(correctDigits(Math.sqrt(fit.sumOfSquares / fit.dof), dataset.certified.residualDeviation, 11)).toBeGreaterThan(8)
  })
})

describe.each(linearNames)('the exact solution of %s', (name) => {
  const { certified } = readLinearDataset(name)
  const { exact } = compareLinear(name)

  it('is the certified one, to the digits that are printed', () => {
    exact.parameters.forEach((value, j) => expect(Math.abs(value - certified.beta[j])).toBeLessThan(6e-3 * Math.abs(certified.beta[j])))
  })

  it('has the certified standard errors, but for two misprints', () => {
    exact.errors.forEach((value, j) => {
      if (name === 'norris' && j === 1) expect(value / certified.error[j]).toBeCloseTo(1000, -1)
      else if (name === 'wampler5' && j === 1) expect(value / certified.error[j]).toBeCloseTo(100, 6)
      else expect(Math.abs(value - certified.error[j])).toBeLessThan(6e-3 * certified.error[j] + 1e-300)
    })
  })
})

describe('exact arithmetic', () => {
  it('has the certified values of Norris in all their digits', () => {
    const { exact } = compareLinear('norris')
    expect(fewestDigits(exact.parameters, [-0.262323073774029, 1.00211681802045])).toBeGreaterThan(14)
    expect(fewestDigits(exact.errors, [0.232818234301152, 0.429796848199937e-3])).toBeGreaterThan(14)
    expect(correctDigits(exact.residualDeviation, 0.884796396144373)).toBeGreaterThan(14)
  })

  it('has the standard error of Wampler5 that NIST prints', () => {
    expect(correctDigits(compareLinear('wampler5').exact.errors[1], 23635517.347)).toBeGreaterThan(9)
  })

  it('reads decimals and writes the nearest doubles', () => {
    for (const text of ['0.1', '-6.860120914', '5E-3', '1e22', '-0', '12345678901234567890', '3.3e-12']) expect(toNumber(fromDecimal(text))).toBe(Number(text) + 0)
    expect(toNumber(over(fromDecimal('1'), fromDecimal('3')))).toBe(1 / 3)
  })

  it('solves a straight line by hand (y = 1, 3, 2, 5 at x = 0 .. 3: 1.1 + 1.1 x, sum of squares 2.7)', () => {
    const one = fromDecimal('1')
    const fit = exactLeastSquares(['0', '1', '2', '3'].map(x => [one, fromDecimal(x)]), ['1', '3', '2', '5'].map(fromDecimal))
    expect([fit.parameters, fit.sumOfSquares]).toEqual([[1.1, 1.1], 2.7])
    expect(fit.errors[0]).toBeCloseTo(Math.sqrt(0.7 * 1.35), 14)
  })
})
