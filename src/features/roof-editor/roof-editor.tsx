import { type KeyboardEvent, useDeferredValue, useEffect, useMemo, useState } from 'react'
import { answerHints } from '../../../shared/revisions/answer-hints.ts'
import type { JobRoof } from '../../../shared/revisions/revision-schemas.ts'
import type { SizesTyped } from '../../../shared/revisions/sizes-typed.ts'
import { isTouched } from '../../lib/pointer.ts'
import { Segmented } from '../../ui/segmented.tsx'
import { CutButUnused } from './cut-but-unused.tsx'
import { EditorHeader } from './editor-header.tsx'
import { ProblemList } from './problem-list.tsx'
import { fieldId, RoofFormContext, type RoofFormHandle } from './roof-form-context.ts'
import { RoofResults } from './roof-results.tsx'
import { DraftConflict } from './save-state.tsx'
import { ShapeFields } from './shape-fields.tsx'
import { SlopeFields } from './slope-fields.tsx'
import { BesideFields, CutFields, LayoutFields, SectionFields } from './timber-fields.tsx'
import { useFramedRoof } from './use-framed-roof.ts'
import { useIssue } from './use-issue.ts'
import { useRoofDraft } from './use-roof-draft.ts'

const parts = [
  { value: 'fields', label: 'Fields' },
  { value: 'plan', label: 'Plan' },
  { value: 'numbers', label: 'Numbers' },
] as const
type Part = (typeof parts)[number]['value']

const noSizes: SizesTyped = {}

/** Fields on the left, the roof they make on the right; on a phone one part at a time. */
export function RoofEditor({ opened }: { opened: JobRoof }) {
  const [part, setPart] = useState<Part>('fields')
  const draft = useRoofDraft(opened)
  const { form, setForm, setText, saver, saveState } = draft
  const { settings, brickOffsetMm } = opened
  const firm = useMemo(() => ({ settings, brickOffsetMm }), [settings, brickOffsetMm])
  const settled = useDeferredValue(form)
  const now = useFramedRoof(settled, firm)
  const { reading, framed } = now
  useStartTyping(form.lengthMm === '')
  const issue = useIssue(opened, { form, firm, saver })

  const hints = useMemo(
    () => answerHints(settled, reading.roof ? (framed?.spec?.cautions ?? []) : [], firm),
    [settled, reading, framed, firm],
  )

  const handle = useMemo((): RoofFormHandle => {
    const shown = new Map(
      (reading.problems ?? [])
        .filter((problem) => issue.wasRefused || !problem.isMissing)
        .map((problem) => [problem.path, problem.message]),
    )
    return {
      form,
      problemAt: (path) => shown.get(path),
      hintAt: (path) => hints.get(path),
      setText,
      setForm,
    }
  }, [form, reading, hints, setForm, setText, issue.wasRefused])

  return (
    <RoofFormContext value={handle}>
      <div onKeyDown={(event) => undoByKey(event, draft)}>
        <EditorHeader opened={opened} draft={draft} issue={issue} />
        {saveState.kind === 'conflict' ? (
          <DraftConflict
            current={saveState.current}
            onTheirs={draft.takeTheirs}
            onMine={draft.keepMine}
          />
        ) : null}
        <CutButUnused issued={issue.last} />
        {issue.problems.length > 0 ? (
          <ProblemList problems={issue.problems} onGo={() => setPart('fields')} />
        ) : null}
        <div className="sticky top-0 z-10 -mx-4 mb-3 bg-paper px-4 py-2 lg:hidden">
          <Segmented label="Part of the page" options={parts} value={part} onChange={setPart} />
        </div>
        <div className="gap-6 lg:grid lg:grid-cols-[minmax(20rem,26rem)_minmax(0,1fr)]">
          <div className={`space-y-4 ${part === 'fields' ? '' : 'hidden lg:block'}`}>
            <ShapeFields />
            <SlopeFields brickOffsetMm={brickOffsetMm} />
            <SectionFields sizesTyped={opened.draft?.sizesTyped ?? noSizes} />
            <BesideFields sizesTyped={opened.draft?.sizesTyped ?? noSizes} />
            <LayoutFields />
            <CutFields />
          </div>
          <div
            className={`lg:sticky lg:top-4 lg:max-h-[calc(100dvh-2rem)] lg:self-start lg:overflow-y-auto ${part === 'fields' ? 'hidden lg:block' : ''}`}
          >
            <RoofResults
              now={now}
              settings={settings}
              part={part === 'numbers' ? 'numbers' : 'plan'}
            />
          </div>
        </div>
      </div>
    </RoofFormContext>
  )
}

/** A roof not begun opens with the cursor in its first measure. */
function useStartTyping(isEmpty: boolean): void {
  const [wasEmpty] = useState(isEmpty)
  useEffect(() => {
    if (!wasEmpty || isTouched()) return
    document.getElementById(fieldId('lengthMm'))?.querySelector('input')?.focus()
  }, [wasEmpty])
}

type Undo = { undo: () => void; redo: () => void }

/** Ctrl or Cmd with Z, with Shift for redo: one undo for the whole form, not one a field. */
function undoByKey(event: KeyboardEvent, { undo, redo }: Undo): void {
  const isZ = event.key.toLowerCase() === 'z' && (event.ctrlKey || event.metaKey)
  const isY = event.key.toLowerCase() === 'y' && event.ctrlKey
  if (!isZ && !isY) return
  event.preventDefault()
  if (isY || event.shiftKey) redo()
  else undo()
}
