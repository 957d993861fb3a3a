import { Link } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import { localDayOf, localTimeOf } from '../../../shared/calendar/local-time.ts'
import type { PersonDetail } from '../../../shared/people/people-schemas.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { useToast } from '../../ui/toast.tsx'
import { useInviteAgain } from './people-queries.ts'

function linkWords({ link, invited, email }: PersonDetail, timeZone: string): string {
  const at = (instant: string | null) => {
    const date = new Date(instant ?? 0)
    return `${formatDay(localDayOf(date, timeZone))}, ${localTimeOf(date, timeZone)}`
  }
  switch (link.state) {
    case 'waiting':
      return `A link is on its way to ${email}.`
    case 'works':
      return `Link sent ${at(link.sentAt)}, not used yet. It works until ${at(link.worksUntil)}.`
    case 'failed':
      return 'The mail with the link did not go.'
    case 'ended':
      return invited ? `The link sent ${at(link.sentAt)} no longer works.` : ''
    case 'none':
      return invited ? 'No link has been sent yet.' : ''
  }
}

/** How the link to sign in stands, and another one. */
export function SignInLink({ person }: { person: PersonDetail }) {
  const { firm } = useSession()
  const invite = useInviteAgain()
  const toast = useToast()
  const { link, invited, email } = person
  return (
    <>
      <p className={invited ? 'font-semibold' : ''}>
        {invited ? 'Has not signed in yet.' : 'Has a password. A link lets them choose another.'}
      </p>
      <p className="mb-2 text-ink-soft [overflow-wrap:anywhere]">
        {linkWords(person, firm.timeZone)}{' '}
        {link.state === 'failed' ? (
          <Link to="/messages" className="text-chalk underline">
            See why under Messages
          </Link>
        ) : null}
      </p>
      <Button
        kind={invited ? 'primary' : 'plain'}
        busy={invite.isPending}
        disabled={!person.active || link.state === 'waiting'}
        onClick={() =>
          invite.mutate(person.id, { onSuccess: () => toast(`A link is on its way to ${email}.`) })
        }
      >
        {link.state === 'none' ? 'Send a link' : 'Send another link'}
      </Button>
      <FormFailure error={invite.error} />
    </>
  )
}
