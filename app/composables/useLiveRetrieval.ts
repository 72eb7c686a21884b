import { isFinal } from '#shared/types/phases'
import type { RetrievalEvent } from '#shared/types/retrieval'
import { usePicture, useRetrievalDetail } from '~/queries/retrieval-detail'

const moving = (phase: string | undefined) => phase === 'QUEUED' || phase === 'EXECUTING'

/** One retrieval that moves to its result by itself: the stream says that something happened, the detail says what. */
export async function useLiveRetrieval(id: string) {
  const asked = useRetrievalDetail(id)
  const { data: detail, error, refresh } = asked
  const pictureId = computed(() => (detail.value?.spectrum && detail.value.result ? id : null))
  const { data: picture, error: pictureError, refresh: refreshPicture } = usePicture(pictureId)

  async function reload() {
    await refresh()
    if (pictureId.value) await refreshPicture()
  }
  const { state } = useEventStream<RetrievalEvent>(() => (moving(detail.value?.phase) ? `/api/retrievals/${id}/events` : null), {
    onEvent: ({ phase, progress, revision }) => {
      if (!detail.value || revision < detail.value.revision) return
      detail.value = { ...detail.value, revision, progress, phase: isFinal(phase) ? detail.value.phase : phase }
      if (isFinal(phase)) void reload()
    },
    onDone: () => void reload(),
    poll: async () => {
      await reload()
      return !moving(detail.value?.phase)
    },
  })
  // Last: after an await nothing may be hung on the page any more.
  await asked
  return { detail, picture, pictureError, error, reload, waiting: computed(() => state.value === 'waiting') }
}
