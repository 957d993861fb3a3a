import { useQuery } from '@tanstack/react-query'
import { Mail, MessageSquare } from 'lucide-react'
import { useLocation, useNavigate } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import { localTimeOf } from '../../../shared/calendar/local-time.ts'
import type { NotToldPerson } from '../../../shared/notices/notice-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { smsHref } from '../../lib/sms-link.ts'
import { Badge } from '../../ui/badge.tsx'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { noticeQueries, useTellThem } from './notice-queries.ts'
import { asTellThem, mailWords, stillToTell } from './not-told-words.ts'

function DayLine({ day, timeZone }: { day: NotToldPerson['days'][number]; timeZone: string }) {
  return (
    <li>
      <p className="flex flex-wrap items-baseline gap-x-2">
        <span className="font-semibold">{formatDay(day.day)}</span>
        {day.isOnItsWay ? (
          <Badge kind="leaf">On its way</Badge>
        ) : day.goesAt ? (
          <span className="text-sm text-ink-soft">
            goes by itself at {localTimeOf(new Date(day.goesAt), timeZone)}
          </span>
        ) : null}
      </p>
      <ul className="list-disc pl-5 text-sm">
        {day.changes.map((change) => (
          <li key={change} className="[overflow-wrap:anywhere]">
            {change}
          </li>
        ))}
      </ul>
    </li>
  )
}

type CardProps = { person: NotToldPerson; timeZone: string; busy: boolean; onTell: () => void }

function PersonCard({ person, timeZone, busy, onTell }: CardProps) {
  const canTell = stillToTell([person]).length > 0
  return (
    <li className="rounded-md border border-rule bg-sheet p-3">
      <h3 className="text-lg font-extrabold [overflow-wrap:anywhere]">{person.name}</h3>
      <ol className="mt-1 space-y-2">
        {person.days.map((day) => (
          <DayLine key={day.day} day={day} timeZone={timeZone} />
        ))}
      </ol>
      {person.hasNoEmail ? (
        <p className="mt-2 font-semibold text-ochre">No e-mail address: text or call.</p>
      ) : null}
      <div className="mt-3 flex flex-wrap gap-2">
        {canTell ? (
          <Button kind="plain" busy={busy} onClick={onTell}>
            <Mail size={18} aria-hidden />
            Tell {person.name.split(' ')[0]}
          </Button>
        ) : null}
        {person.textIt ? (
          <a className={buttonClass('quiet')} href={smsHref(person.textIt)}>
            <MessageSquare size={18} aria-hidden />
            Text it
          </a>
        ) : null}
      </div>
    </li>
  )
}

/** What changed and who has not been told of it, a person each; one press sends one mail a person. */
export function NotToldPanel() {
  const navigate = useNavigate()
  const { search } = useLocation()
  const { firm } = useSession()
  const toast = useToast()
  const { data, error, refetch } = useQuery(noticeQueries.list())
  const tellThem = useTellThem()
  const close = () => void navigate(`/calendar${search}`)
  const tell = (people: readonly NotToldPerson[]) =>
    tellThem.mutate(asTellThem(people), {
      onSuccess: ({ mails }) => toast(`${mailWords(mails)} on the way. Messages shows each.`),
      onError: (failure) => toast(failureText(failure) ?? failure.message, { kind: 'stop' }),
    })
  const waiting = stillToTell(data?.people ?? [])
  return (
    <Dialog open place="panel" title="Not yet told" onClose={close}>
      {error ? (
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      ) : !data ? (
        <PageSkeleton />
      ) : data.people.length === 0 ? (
        <EmptyState title="Everybody knows">
          A firm day that is new or moved, or that says something else than its mail did, is listed
          here until its people are told.
        </EmptyState>
      ) : (
        <div className="space-y-4">
          <p className="text-ink-soft">
            The net change since each person’s last mail. Moved there and back is nothing. Days that
            a reminder has told already go by themselves {data.holdMinutes} minutes after the last
            change; all others wait for you, or for their reminder.
          </p>
          {waiting.length > 1 ? (
            <Button busy={tellThem.isPending} onClick={() => tell(data.people)}>
              <Mail size={20} aria-hidden />
              Tell them ({mailWords(waiting.length)})
            </Button>
          ) : null}
          <ul className="space-y-3">
            {data.people.map((person) => (
              <PersonCard
                key={person.id}
                person={person}
                timeZone={firm.timeZone}
                busy={tellThem.isPending}
                onTell={() => tell([person])}
              />
            ))}
          </ul>
        </div>
      )}
    </Dialog>
  )
}
