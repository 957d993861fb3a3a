import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useReducer, useRef, useState, useSyncExternalStore } from 'react'
import type { JobRoof, RoofDraft } from '../../../shared/revisions/revision-schemas.ts'
import { formOfShape, type RoofForm } from '../../../shared/revisions/roof-form.ts'
import { createDraftSaver, type DraftSaver } from './draft-saver.ts'
import { formHistoryReducer, historyOf } from './form-history.ts'
import { roofQueries, saveDraft } from './roof-queries.ts'
import { keepUnsaved, readUnsaved } from './unsaved-draft.ts'

function useDraftSaver(jobId: string, version: number): DraftSaver {
  const client = useQueryClient()
  const [saver] = useState(() =>
    createDraftSaver({
      version,
      keep: (unsaved) => keepUnsaved(jobId, unsaved),
      send: async (form, over) => {
        const saved = await saveDraft(jobId, form, over)
        client.setQueryData(roofQueries.ofJob(jobId).queryKey, (old) =>
          old ? { ...old, draft: { form, ...saved } } : old,
        )
        return saved
      },
    }),
  )
  return saver
}

/** Asks before the page is left while something is not saved. */
function useLeaveGuard(isUnsaved: boolean): void {
  useEffect(() => {
    if (!isUnsaved) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [isUnsaved])
}

/** The typed form with undo and redo, saved as it changes. */
export function useRoofDraft(opened: JobRoof) {
  const jobId = opened.job.id
  const [unsaved] = useState(() => readUnsaved(jobId))
  const [history, dispatch] = useReducer(
    formHistoryReducer,
    unsaved?.form ?? opened.draft?.form ?? formOfShape('rectangle'),
    historyOf,
  )
  const saver = useDraftSaver(jobId, unsaved?.version ?? opened.draft?.version ?? 0)
  const saveState = useSyncExternalStore(saver.subscribe, saver.state)
  const form = history.now
  const known = useRef<RoofForm | null>(unsaved ? null : form)
  useEffect(() => {
    if (known.current === form) return
    known.current = form
    saver.changed(form)
  }, [form, saver])
  useEffect(() => () => void saver.flush(), [saver])
  useEffect(() => {
    const retry = () => void saver.flush()
    window.addEventListener('online', retry)
    return () => window.removeEventListener('online', retry)
  }, [saver])
  useLeaveGuard(saveState.kind !== 'saved')

  const setForm = useCallback(
    (next: RoofForm, path: string) =>
      dispatch({ kind: 'change', form: next, path, atMs: Date.now() }),
    [],
  )
  const setText = useCallback(
    (path: string, text: string) => dispatch({ kind: 'text', path, text, atMs: Date.now() }),
    [],
  )
  const takeTheirs = (theirs: RoofDraft | null) => {
    const next = theirs?.form ?? formOfShape('rectangle')
    known.current = next
    saver.adopt(theirs?.version ?? 0, null)
    dispatch({ kind: 'replace', form: next })
  }
  return {
    form,
    setForm,
    setText,
    saver,
    saveState,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    undo: () => dispatch({ kind: 'undo' }),
    redo: () => dispatch({ kind: 'redo' }),
    takeTheirs,
    keepMine: (theirs: RoofDraft | null) => saver.adopt(theirs?.version ?? 0, form),
  }
}
