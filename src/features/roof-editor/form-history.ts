import { withText } from '../../../shared/revisions/form-paths.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'

/** What was typed, back and forth; keystrokes in one field within a moment are one step. */
export type FormHistory = {
  past: RoofForm[]
  now: RoofForm
  future: RoofForm[]
  last: { path: string; atMs: number } | null
}

export type FormAction =
  | { kind: 'text'; path: string; text: string; atMs: number }
  | { kind: 'change'; form: RoofForm; path: string; atMs: number }
  | { kind: 'undo' }
  | { kind: 'redo' }
  | { kind: 'replace'; form: RoofForm }

const oneStepMs = 1_000
const mostSteps = 200

export function historyOf(form: RoofForm): FormHistory {
  return { past: [], now: form, future: [], last: null }
}

export function formHistoryReducer(history: FormHistory, action: FormAction): FormHistory {
  const { past, now, future } = history
  if (action.kind === 'change') return changed(history, action)
  if (action.kind === 'text') {
    const { path, text, atMs } = action
    return changed(history, { form: withText(now, path, text), path, atMs })
  }
  if (action.kind === 'replace') return historyOf(action.form)
  if (action.kind === 'undo') {
    const before = past.at(-1)
    if (!before) return history
    return { past: past.slice(0, -1), now: before, future: [now, ...future], last: null }
  }
  const after = future[0]
  if (!after) return history
  return { past: [...past, now], now: after, future: future.slice(1), last: null }
}

function changed(
  history: FormHistory,
  { form, path, atMs }: { form: RoofForm; path: string; atMs: number },
): FormHistory {
  const { past, now, last } = history
  if (form === now) return history
  const goesOn = last !== null && last.path === path && atMs - last.atMs < oneStepMs
  return {
    past: goesOn ? past : [...past.slice(1 - mostSteps), now],
    now: form,
    future: [],
    last: { path, atMs },
  }
}
