import { Check, CircleAlert, LoaderCircle } from 'lucide-react'
import type { RoofDraft } from '../../../shared/revisions/revision-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'
import type { SaveState } from './draft-saver.ts'

/** Whether what is typed has reached the office's records. */
export function SaveStateLine({ state, onRetry }: { state: SaveState; onRetry: () => void }) {
  if (state.kind === 'failed' || state.kind === 'conflict') {
    return (
      <p role="status" className="flex flex-wrap items-center gap-2 font-semibold text-stop">
        <CircleAlert size={18} aria-hidden /> Not saved
        {state.kind === 'failed' ? (
          <Button kind="plain" onClick={onRetry} title={state.message}>
            Try again
          </Button>
        ) : null}
      </p>
    )
  }
  const isSaving = state.kind === 'saving'
  return (
    <p role="status" className="flex min-h-11 items-center gap-2 text-ink-soft">
      {isSaving ? <LoaderCircle size={18} aria-hidden /> : <Check size={18} aria-hidden />}
      {isSaving ? 'Saving' : 'Saved'}
    </p>
  )
}

type ConflictProps = {
  current: RoofDraft | null
  onTheirs: (current: RoofDraft | null) => void
  onMine: (current: RoofDraft | null) => void
}

/** Two people typed at once: nothing is thrown away before one of them says which holds. */
export function DraftConflict({ current, onTheirs, onMine }: ConflictProps) {
  return (
    <div role="alert" className="mb-4">
      <Note kind="stop" title="Somebody else changed this roof since you opened it">
        <p>What you typed is still here and is not saved. Choose which one holds.</p>
        <div className="mt-2 flex flex-wrap gap-2">
          <Button kind="plain" onClick={() => onMine(current)}>
            Keep mine, over theirs
          </Button>
          <Button kind="plain" onClick={() => onTheirs(current)}>
            Take theirs, drop mine
          </Button>
        </div>
      </Note>
    </div>
  )
}
