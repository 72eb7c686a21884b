export interface ReceivedEvent { id: string, event: string, data: { retrievalId?: string, phase?: string, done?: boolean, byPhase?: Record<string, number> } }

/** A stream of server-sent events as it comes in. */
export interface OpenStream {
  status: number
  events: ReceivedEvent[]
  comments: string[]
  /** Resolves when the server has ended the stream. */
  ended: Promise<void>
  close: () => void
}

export async function readStream(response: Response, close: () => void): Promise<OpenStream> {
  const stream: OpenStream = { status: response.status, events: [], comments: [], ended: Promise.resolve(), close }
  stream.ended = consume(response, stream).catch(() => undefined)
  return stream
}

async function consume(response: Response, { events, comments }: OpenStream): Promise<void> {
  const decoder = new TextDecoder()
  let text = ''
  for await (const part of response.body ?? []) {
    text += decoder.decode(part as Uint8Array, { stream: true })
    const blocks = text.split('\n\n')
    text = blocks.pop()!
    for (const block of blocks) {
      if (block.startsWith(':')) comments.push(block)
      const fields = Object.fromEntries(block.split('\n').map(line => [line.slice(0, line.indexOf(':')), line.slice(line.indexOf(':') + 2)]))
      if (fields.event) events.push({ id: fields.id!, event: fields.event, data: JSON.parse(fields.data!) as ReceivedEvent['data'] })
    }
  }
}

export async function openStream(address: string, token: string, headers: Record<string, string> = {}): Promise<OpenStream> {
  const control = new AbortController()
  const response = await fetch(address, { headers: { authorization: `Bearer ${token}`, ...headers }, signal: control.signal })
  return readStream(response, () => control.abort())
}
