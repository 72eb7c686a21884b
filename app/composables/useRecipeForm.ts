import type { RetrievalSettings } from '#shared/schemas/settings'
import type { LineList, LineListSummary } from '#shared/types/line-list'

/** A recipe while it is made: what the line list offers for its settings. `form` gives the settings of the form. */
export function useRecipeForm(form: () => RetrievalSettings, list: Readonly<Ref<LineList | null | undefined>>, lists: Readonly<Ref<LineListSummary[]>>) {
  const bands = computed(() => list.value?.bands.filter(band => form().bands.includes(band.id)) ?? [])
  /** Labels that any chosen band has, in the order of the list. */
  const labels = computed(() => [...new Set(bands.value.flatMap(band => band.lines.map(line => line.label)))])
  const recommended = computed(() => new Set(bands.value.flatMap(band => band.recommendedLines)))

  /** Chosen lines that a strength set lacks, as "band label". */
  function lacking(set: string): string[] {
    return bands.value.flatMap((band) => {
      const wanted = form().lines.length ? form().lines : band.recommendedLines
      return band.lines
        .filter(line => wanted.includes(line.label) && line.components.some(component => component.strengths[set] === undefined))
        .map(line => `${band.id} ${line.label}`)
    })
  }

  /** Another list has other bands, lines and strengths, and says what is observed. */
  function pickList(id: string | null): void {
    const picked = lists.value.find(item => item.id === id)
    const onlyBand = picked?.bands.length === 1 ? [picked.bands[0]!.id] : []
    Object.assign(form(), { lineList: id, bands: onlyBand, lines: [], strengthSet: null })
    if (picked) form().observable = picked.recommendedObservable as RetrievalSettings['observable']
  }

  /** Lines that no chosen band has any more go with their band. */
  function pickBands(wanted: string[]): void {
    const settings = form()
    settings.bands = wanted
    settings.lines = settings.lines.filter(label => labels.value.includes(label))
  }

  const setOptions = computed(() => [
    { value: null, label: 'The first that is complete for the lines' },
    ...(list.value?.strengthSets ?? []).map((set) => {
      const missing = lacking(set.name)
      return { value: set.name, label: missing.length ? `${set.name} (lacks ${missing.slice(0, 2).join(', ')}${missing.length > 2 ? ' and more' : ''})` : `${set.name}: ${set.title}`, disabled: missing.length > 0 }
    }),
  ])
  return { bands, labels, recommended, lacking, setOptions, pickList, pickBands }
}
