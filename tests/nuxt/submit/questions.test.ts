import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import FileQuestions from '~/components/submit/FileQuestions.vue'
import { newEntry, questionsOf, type FileEntry } from '~/utils/submit/entries'

const file: FileEntry = {
  ...newEntry(1, new File(['x'], 'night.fits')), state: 'ready',
  read: { format: 'fits', pixelCount: 2214, axisFrom: 15857.886, axisTo: 16434.696, valueFrom: 0, valueTo: 9, hasSigma: false, columnNames: [], firstRows: [], stated: {}, warnings: [] },
}
const questions = (entry: FileEntry, others = 0, toAll = false) => mountSuspended(FileQuestions, { props: { entry, fields: questionsOf(entry), others, toAll } })

describe('questions about a file', () => {
  it('are asked with nothing chosen and with the numbers of the file', async () => {
    const wrapper = await questions(file)
    expect(wrapper.findAll('legend').map(legend => legend.text())).toEqual(['In which unit is the axis?', 'Are the wavelengths those in vacuum or in air?', 'Do the values count photons or energy?'])
    expect(wrapper.findAll('input:checked')).toHaveLength(0)
    expect(wrapper.text()).toContain('from 15857.886 to 16434.696 in 2214 pixels')
    expect(wrapper.text()).toContain('1585.8–1643.5 nm')
  })

  it('answer this file only, unless all are meant', async () => {
    const one = await questions(file)
    await one.get('input[value=angstrom]').setValue()
    expect(one.emitted('answer')).toEqual([[{ axisUnit: 'angstrom' }, false]])
    const all = await questions(file, 3, true)
    await all.get('input[value=photons]').setValue()
    expect(all.emitted('answer')).toEqual([[{ valueKind: 'photons' }, true]])
  })

  it('offer to answer the others only when others lack it too', async () => {
    expect((await questions(file)).text()).not.toContain('Give each answer')
    expect((await questions(file, 999)).text()).toContain('Give each answer to the 999 other files that lack it too')
  })

  it('take a frequency as one in vacuum and ask no medium', async () => {
    const wrapper = await questions(file)
    await wrapper.get('input[value=GHz]').setValue()
    expect(wrapper.emitted('answer')![0]![0]).toEqual({ axisUnit: 'GHz', medium: 'vacuum' })
    expect(questionsOf({ ...file, answers: { axisUnit: 'GHz', medium: 'vacuum' } })).toEqual(['axisUnit', 'valueKind'])
  })

  it('ask for the air formula once air is answered', async () => {
    expect((await questions(file)).text()).not.toContain('Formula')
    expect((await questions({ ...file, answers: { axisUnit: 'nm', medium: 'air' } })).text()).toContain('Formula that leads from air to vacuum')
  })
})
