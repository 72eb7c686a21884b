import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { settingsSchema } from '#shared/schemas/settings'
import { loadLineList } from '#shared/line-lists/index'
import { tasks } from '~/workers/tasks'
import { thinnedPixels } from '~/workers/thin'

const sky = () => new File([readFileSync('tests/truth/spectra/nearir_sky_b.fits')], 'nearir_sky_b.fits')

describe('reading a file in the worker', () => {
  it('says what a real FITS spectrum states and leaves the rest to be asked', async () => {
    const read = await tasks.read({ file: sky(), about: {} })
    expect(read).toMatchObject({ format: 'fits', pixelCount: 2214, hasSigma: false })
    expect(read.axisFrom).toBeCloseTo(15857.886, 2)
    expect(read.stated.axisUnit ?? null).toBeNull()
  })

  it('gives the first rows of a text file without a heading for the question about columns', async () => {
    const read = await tasks.read({ file: new File(['1 10 0.1\n2 11 0.1\n3 12 0.1\n4 11 0.1\n5 10 0.1\n'], 'plain.txt'), about: {} })
    expect(read.columnNames).toHaveLength(3)
    expect(read.firstRows[0]).toEqual([1, 10, 0.1])
    expect(read.stated.columns ?? null).toBeNull()
  })

  it('says what is wrong and where', async () => {
    await expect(tasks.read({ file: new File(['1,2\n2,x\n3,4\n'], 'bad.csv'), about: {} })).rejects.toThrow(/line 2/i)
    await expect(tasks.read({ file: new File([], 'empty.csv'), about: {} })).rejects.toThrow('The file is empty.')
  })
})

describe('a preview fit', () => {
  const settings = settingsSchema.parse({ lineList: 'oh-meinel', bands: ['4-2'], noise: 'from-residuals' })

  it('reads OH(4-2) of a real night sky within 3 K of two independent readings by hand', async () => {
    const lineList = (await loadLineList('oh-meinel'))!
    const about = { axisUnit: 'angstrom', medium: 'vacuum', valueKind: 'photons' } as const
    const { result } = await tasks.fitSpectrum({ file: sky(), about, settings, lineList })
    // 184.9 and 185.5 K: tests/truth/spectra/SOURCE.md
    expect(Math.abs(result!.temperature!.value - 185.2)).toBeLessThan(3)
    expect(result!.strengthSet).toBe('brooke2016')
  })

  it('says what is missing instead of fitting', async () => {
    const lineList = (await loadLineList('oh-meinel'))!
    const { result, problems } = await tasks.fitSpectrum({ file: sky(), about: { axisUnit: 'angstrom', valueKind: 'photons' }, settings, lineList })
    expect(result).toBeNull()
    expect(problems![0]!.message).toMatch(/vacuum or in air/)
  })
})

describe('thinnedPixels', () => {
  it('keeps the highest pixel of a long spectrum', () => {
    const values = Array.from({ length: 100_000 }, (_, index) => (index === 77_777 ? 9 : Math.sin(index)))
    const kept = thinnedPixels(values, 2000)
    expect(kept.length).toBeLessThanOrEqual(2000)
    expect(kept).toContain(77_777)
    expect([...kept].sort((a, b) => a - b)).toEqual(kept)
  })
  it('leaves a short spectrum as it is', () => expect(thinnedPixels([3, 1, 2], 10)).toEqual([0, 1, 2]))
})
