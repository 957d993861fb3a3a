import type { Leave } from '../../../shared/people/leave-schemas.ts'
import { leaveKindNames, leaveSpanText } from '../../../shared/people/leave-words.ts'
import type { PersonDetail } from '../../../shared/people/people-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { useToast } from '../../ui/toast.tsx'
import { LeaveForm } from './leave-form.tsx'
import { PanelSection } from './panel-section.tsx'
import { useAddLeave, useDropLeave } from './time-queries.ts'

export function PersonLeave({ person }: { person: PersonDetail }) {
  const { firm } = useSession()
  const add = useAddLeave()
  const drop = useDropLeave()
  const toast = useToast()
  const back = (leave: Omit<Leave, 'id'>) =>
    add.mutate(
      { id: person.id, ...leave },
      { onError: (error) => toast(failureText(error) ?? '', { kind: 'stop' }) },
    )
  const takeBack = ({ id, ...leave }: Leave) =>
    drop.mutate(
      { id: person.id, leaveId: id },
      { onSuccess: () => toast('Leave taken back.', { undo: () => back(leave) }) },
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
      <FormFailure error={drop.error} />
    </PanelSection>
  )
}
