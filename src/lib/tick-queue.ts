import { z } from 'zod'

const pendingTickSchema = z.object({
  id: z.string(),
  taskId: z.string(),
  delta: z.union([z.literal(1), z.literal(-1)]),
})
export type PendingTick = z.infer<typeof pendingTickSchema>

/** What became of a tick: taken; to be tried again; or refused for good. */
export type TickOutcome = 'sent' | 'later' | 'refused'

type Deps = {
  key: string
  storage: Pick<Storage, 'getItem' | 'setItem'>
  send: (tick: PendingTick) => Promise<TickOutcome>
  /** Milliseconds until the next try after so many failures in a row. */
  waitMs?: (failures: number) => number
}

export type TickQueue = {
  add(tick: PendingTick): void
  flush(): void
  snapshot(): readonly PendingTick[]
  subscribe(listener: () => void): () => void
}

const longestWaitMs = 30_000
const doublingWaitMs = (failures: number) => Math.min(longestWaitMs, 1000 * 2 ** failures)

/**
 * Ticks made on this device and not yet on the server, in their order. Kept in the device's storage, each
 * with its id, so that a lost answer or a reload repeats a tick without counting it twice.
 */
export function createTickQueue({ key, storage, send, waitMs = doublingWaitMs }: Deps): TickQueue {
  let pending = readPending(storage, key)
  let isSending = false
  let failures = 0
  let timer: ReturnType<typeof setTimeout> | undefined
  const listeners = new Set<() => void>()

  function change(next: readonly PendingTick[]): void {
    pending = next
    try {
      storage.setItem(key, JSON.stringify(next))
    } catch {
      // Storage may be full or shut off; the ticks then last until the page is closed.
    }
    for (const listener of listeners) listener()
  }

  async function run(): Promise<void> {
    if (isSending) return
    isSending = true
    clearTimeout(timer)
    try {
      for (let first = pending[0]; first; first = pending[0]) {
        const { id } = first
        const outcome = await send(first)
        if (outcome === 'later') {
          failures++
          timer = setTimeout(() => void run(), waitMs(failures))
          return
        }
        failures = 0
        change(pending.filter((tick) => tick.id !== id))
      }
    } finally {
      isSending = false
    }
  }

  return {
    add(tick) {
      change([...pending, tick])
      void run()
    },
    flush: () => void run(),
    snapshot: () => pending,
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
  }
}

function readPending(storage: Pick<Storage, 'getItem'>, key: string): readonly PendingTick[] {
  try {
    const parsed = z.array(pendingTickSchema).safeParse(JSON.parse(storage.getItem(key) ?? '[]'))
    return parsed.success ? parsed.data : []
  } catch {
    return []
  }
}
