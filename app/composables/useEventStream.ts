export interface EventStreamOptions<T, D> {
  /** Called for every `phase` and `progress` event. */
  onEvent: (event: T) => void
  /** Called once for the closing `done`. */
  onDone?: (data: D) => void
  /** Asked every `pollEvery` ms while the stream cannot be had; true ends the asking. */
  poll?: () => Promise<boolean>
  pollEvery?: number
}

/**
 * Follows a stream of server-sent events. The browser reconnects by itself and says where it left off (Last-Event-ID);
 * when it gives up (closed by a proxy, refused) we ask by `poll` and try the stream again.
 */
export function useEventStream<T, D = unknown>(url: MaybeRefOrGetter<string | null>, options: EventStreamOptions<T, D>) {
  const state = ref<'idle' | 'live' | 'waiting' | 'done'>('idle')
  let source: EventSource | null = null
  let timer: ReturnType<typeof setTimeout> | undefined

  function close() {
    source?.close()
    source = null
    clearTimeout(timer)
  }
  function finish(data: D) {
    close()
    state.value = 'done'
    options.onDone?.(data)
  }
  async function askAndRetry(address: string) {
    state.value = 'waiting'
    const finished = await options.poll?.().catch(() => false)
    if (toValue(url) !== address) return
    if (finished) {
      state.value = 'done'
      return
    }
    timer = setTimeout(() => open(address), options.pollEvery ?? 4000)
  }
  function open(address: string) {
    close()
    const opened = new EventSource(address)
    source = opened
    const receive = (message: MessageEvent<string>) => options.onEvent(JSON.parse(message.data) as T)
    opened.addEventListener('phase', receive)
    opened.addEventListener('progress', receive)
    opened.addEventListener('done', message => finish(JSON.parse(message.data) as D))
    opened.addEventListener('open', () => { state.value = 'live' })
    opened.addEventListener('error', () => {
      if (source !== opened) return
      state.value = 'waiting'
      if (opened.readyState !== EventSource.CLOSED) return
      close()
      void askAndRetry(address)
    })
  }
  if (import.meta.client) {
    watch(() => toValue(url), (address) => {
      close()
      state.value = 'idle'
      if (address) open(address)
    }, { immediate: true })
    onScopeDispose(close)
  }
  return { state, close }
}
