import { useState } from 'react'
import type { MilestoneState } from '../../../shared/milestones/milestone-kinds.ts'
import { milestoneNames, pressedState } from '../../../shared/milestones/milestone-rules.ts'
import type {
  Milestone,
  MilestoneConflict,
  SetMilestone,
} from '../../../shared/milestones/milestone-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useToast } from '../../ui/toast.tsx'
import { milestoneConflictOf, useSetMilestone } from './milestone-queries.ts'

export type MilestoneFields = Omit<SetMilestone, 'version'>

/** One milestone set by a press or a form, taken back by Undo while nobody has set it again. */
export function useMilestone(jobId: string, milestone: Milestone) {
  const toast = useToast()
  const { today } = useSession().firm
  const set = useSetMilestone(jobId)
  const [conflict, setConflict] = useState<MilestoneConflict | null>(null)
  // What an open form began from: a change by somebody else meanwhile must not be written over.
  const [base, setBase] = useState<Milestone | null>(null)
  const { kind } = milestone
  const name = milestoneNames[kind]
  const stop = (error: unknown) =>
    toast(failureText(error) ?? 'That was not saved. Try again.', { kind: 'stop' })

  const sayDone = (before: Milestone, after: Milestone) => {
    const { day, state, broughtBy, note } = before
    const back = { kind, version: after.version, day, state, broughtBy, note }
    toast(`${name}: saved.`, { undo: () => set.mutate(back, { onError: stop }) })
  }

  const send = (
    fields: MilestoneFields,
    from: Milestone,
    onSaved: (after: Milestone) => void = () => setBase(null),
  ) => {
    if (set.isPending) return
    set.mutate(
      { ...fields, kind, version: from.version },
      {
        onSuccess: ({ milestones }) => {
          const after = milestones.find((one) => one.kind === kind) ?? from
          setConflict(null)
          onSaved(after)
          if (after.version !== from.version) sayDone(from, after)
        },
        onError: (error) => {
          const found = milestoneConflictOf(error)
          setConflict(found)
          if (!found) stop(error)
        },
      },
    )
  }

  return {
    press: (state: MilestoneState) =>
      send(pressedState(milestone, state, today), milestone, (after) =>
        setBase((open) => (open ? after : null)),
      ),
    base,
    open: () => setBase(milestone),
    shut: () => setBase(null),
    save: (fields: MilestoneFields) => (base ? send(fields, base) : undefined),
    conflict,
    /** What was sent, over what somebody else made of it meanwhile. */
    sendOver: (found: MilestoneConflict) => send(found.sent, found.current),
    takeTheirs: () => {
      setConflict(null)
      setBase(null)
    },
    error: set.error,
    busy: set.isPending,
  }
}
