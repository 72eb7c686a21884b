import { settingsSchema, type RetrievalSettings } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'

/** A recipe while it is made: settings, what is wrong with them as one types, and what the line list offers. */
export function useRecipeForm(list: Readonly<Ref<LineList | null | undefined>>) {
  const settings = reactive<RetrievalSettings>(settingsSchema.parse({}))
  const checked = computed(() => settingsSchema.safeParse(settings))
  const problems = computed(() => new Map(checked.value.success ? [] : checked.value.error.issues.map(issue => [issue.path.join('.'), issue.message])))
  const problem = (path: string) => [...problems.value].find(([where]) => where === path || where.startsWith(`${path}.`))?.[1]

  const bands = computed(() => list.value?.bands.filter(band => settings.bands.includes(band.id)) ?? [])
  /** Labels that any chosen band has, in the order of the list. */
  const labels = computed(() => [...new Set(bands.value.flatMap(band => band.lines.map(line => line.label)))])
  const recommended = computed(() => new Set(bands.value.flatMap(band => band.recommendedLines)))

  /** Chosen lines that a strength set lacks, as "band label". */
  function lacking(set: string): string[] {
    return bands.value.flatMap((band) => {
      const wanted = settings.lines.length ? settings.lines : band.recommendedLines
      return band.lines
        .filter(line => wanted.includes(line.label) && line.components.some(component => component.strengths[set] === undefined))
        .map(line => `${band.id} ${line.label}`)
    })
  }

  watch(() => settings.lineList, () => Object.assign(settings, { bands: [], lines: [], strengthSet: null }))
  watch(list, (loaded) => { if (loaded) settings.observable = loaded.recommendedObservable as RetrievalSettings['observable'] })
  watch(labels, (known) => { settings.lines = settings.lines.filter(label => known.includes(label)) })
  return { settings, checked, problem, bands, labels, recommended, lacking }
}
