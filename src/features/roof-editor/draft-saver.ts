import { type RoofDraft, staleDraftSchema } from '../../../shared/revisions/revision-schemas.ts'
import { type RoofForm, roofFormSchema } from '../../../shared/revisions/roof-form.ts'
import { ApiFailure } from '../../lib/api-client.ts'

export type SaveState =
  | { kind: 'saved' }
  | { kind: 'saving' }
  | { kind: 'failed'; message: string }
  /** Somebody else saved meanwhile; `current` is theirs. */
  | { kind: 'conflict'; current: RoofDraft | null }

export type DraftSaver = {
  subscribe(listener: () => void): () => void
  state(): SaveState
  changed(form: RoofForm): void
  /** Saves what is waiting now; the version to issue, or null when it could not be saved. */
  flush(): Promise<number | null>
  /** From now on writes over `version`, as seen in a conflict. */
  adopt(version: number, form: RoofForm | null): void
}

type Options = {
  version: number
  send: (form: RoofForm, version: number) => Promise<{ version: number }>
  /** Keeps what is not saved on this device; null once it is. */
  keep: (unsaved: { form: RoofForm; version: number } | null) => void
  delayMs?: number
  retryMs?: number
}

const defaultDelayMs = 700
const defaultRetryMs = 10_000

/** Saves a draft a moment after typing stops, one request at a time, the newest form last. */
export function createDraftSaver(options: Options): DraftSaver {
  const { send, keep, delayMs = defaultDelayMs, retryMs = defaultRetryMs } = options
  const listeners = new Set<() => void>()
  let version = options.version
  let waiting: RoofForm | null = null
  let running: Promise<void> | null = null
  let timer: ReturnType<typeof setTimeout> | undefined
  let state: SaveState = { kind: 'saved' }

  const setState = (next: SaveState) => {
    state = next
    for (const listener of listeners) listener()
  }
  const later = (ms: number) => {
    clearTimeout(timer)
    timer = setTimeout(() => void run(), ms)
  }

  async function saveOnce(form: RoofForm): Promise<boolean> {
    try {
      version = (await send(form, version)).version
      if (waiting === form) waiting = null
      return true
    } catch (error) {
      const current = staleDraftOf(error)
      if (current?.form && sameForm(current.form, form)) {
        // An earlier try did arrive; only its answer was lost.
        version = current.version
        if (waiting === form) waiting = null
        return true
      }
      if (current !== undefined) setState({ kind: 'conflict', current })
      else {
        const message = error instanceof ApiFailure ? error.message : 'Not saved. Try again.'
        setState({ kind: 'failed', message })
        later(retryMs)
      }
      return false
    }
  }

  async function saveAll(): Promise<void> {
    while (waiting !== null) {
      setState({ kind: 'saving' })
      if (!(await saveOnce(waiting))) return
      keep(waiting === null ? null : { form: waiting, version })
    }
    setState({ kind: 'saved' })
  }

  function run(): Promise<void> {
    clearTimeout(timer)
    running ??= saveAll().finally(() => {
      running = null
    })
    return running
  }

  return {
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    state: () => state,
    changed(form) {
      waiting = form
      keep({ form, version })
      if (state.kind === 'conflict') return
      if (state.kind !== 'failed') setState({ kind: 'saving' })
      later(delayMs)
    },
    async flush() {
      if (state.kind === 'conflict') return null
      if (waiting !== null || running) await run()
      return waiting === null && version > 0 ? version : null
    },
    adopt(nextVersion, form) {
      version = nextVersion
      waiting = form
      keep(form === null ? null : { form, version })
      setState({ kind: form === null ? 'saved' : 'saving' })
      if (form !== null) void run()
    },
  }
}

/** What somebody else saved meanwhile (null: nothing is there any more); undefined for other failures. */
function staleDraftOf(error: unknown): RoofDraft | null | undefined {
  if (!(error instanceof ApiFailure) || error.status !== 409) return undefined
  const parsed = staleDraftSchema.safeParse(error.error.detail)
  return parsed.success ? parsed.data.current : null
}

function sameForm(a: RoofForm, b: RoofForm): boolean {
  const inOrder = (form: RoofForm) => JSON.stringify(roofFormSchema.parse(form))
  return inOrder(a) === inOrder(b)
}
