import type { Leave } from '../../../shared/people/leave-schemas.ts'
import { leaveKindNames, leaveSpanText } from '../../../shared/people/leave-words.ts'
import type { PersonDetail } from '../../../shared/people/people-schemas.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { LeaveForm } from './leave-form.tsx'
import { PanelSection } from './panel-section.tsx'
import { useAddLeave, useDropLeave } from './time-queries.ts'
import { useUndoLine } from './use-undo-line.tsx'

export function PersonLeave({ person }: { person: PersonDetail }) {
  const { firm } = useSession()
  const add = useAddLeave()
  const drop = useDropLeave()
  const { line, say } = useUndoLine()
  const takeBack = ({ id: leaveId, ...leave }: Leave) =>
    drop.mutate(
      { id: person.id, leaveId },
      {
        onSuccess: () =>
          say(
            `Taken back: ${leaveKindNames[leave.kind]} ${leaveSpanText(leave, firm.today)}.`,
            () => add.mutateAsync({ id: person.id, ...leave }),
          ),
      },
    )
  return (
    <PanelSection
      title="Leave"
      action="Add leave"
      form={(close) => <LeaveForm personId={person.id} onDone={close} />}
    >
      {person.leave.length === 0 ? <p className="text-ink-soft">None from today on.</p> : null}
      <ul className="divide-y divide-rule">
        {person.leave.map((leave) => (
          <li key={leave.id} className="flex items-center justify-between gap-3 py-1">
            <span className="min-w-0 [overflow-wrap:anywhere]">
              <span className="font-semibold">{leaveKindNames[leave.kind]}</span>{' '}
              {leaveSpanText(leave, firm.today)}
              {leave.reason ? <span className="block text-ink-soft">{leave.reason}</span> : null}
            </span>
            <Button
              kind="quiet"
              className="shrink-0"
              busy={drop.isPending && drop.variables.leaveId === leave.id}
              onClick={() => takeBack(leave)}
              aria-label={`Take back ${leaveKindNames[leave.kind]} ${leaveSpanText(leave, firm.today)}`}
            >
              Take back
            </Button>
          </li>
        ))}
      </ul>
      {line}
      <FormFailure error={drop.error} />
    </PanelSection>
  )
}
