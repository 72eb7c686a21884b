import { describe, expect, it } from 'vitest'
import { groupBy, uploadSlices } from '~/utils/submit/slices'

const files = (count: number, size: number) => Array.from({ length: count }, (_, id) => ({ id, size }))

describe('uploadSlices', () => {
  it('sends at most fifty files in a request', () => {
    expect(uploadSlices(files(120, 10)).map(slice => slice.length)).toEqual([50, 50, 20])
  })
  it('sends at most 64 MB in a request', () => {
    expect(uploadSlices(files(5, 30 * 1024 * 1024)).map(slice => slice.length)).toEqual([2, 2, 1])
  })
  it('lets a file above the limit travel alone and loses none', () => {
    const slices = uploadSlices([{ size: 1 }, { size: 200 }, { size: 1 }], { files: 50, bytes: 100 })
    expect(slices.map(slice => slice.map(file => file.size))).toEqual([[1], [200], [1]])
  })
  it('keeps the order of a thousand files', () => {
    expect(uploadSlices(files(1000, 31_000)).flat().map(file => file.id)).toEqual(Array.from({ length: 1000 }, (_, id) => id))
  })
  it('makes no request for no file', () => expect(uploadSlices([])).toEqual([]))
})

describe('groupBy', () => {
  it('keeps groups in order of first appearance', () => {
    expect(groupBy(['b1', 'a1', 'b2'], word => word[0]!)).toEqual([['b1', 'b2'], ['a1']])
  })
})
