import { useQuery } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { Link, useNavigate, useSearchParams } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { RainOffList } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { failureText, issueAt } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Select, TextArea, TextInput } from '../../ui/inputs.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { rainOffQueries, useAskRainOff } from './rain-off-queries.ts'
import { RainOffHeightNote } from './rain-off-result.tsx'
import { workingDaysWords } from './rain-off-words.ts'

/** More is for the office to settle on the telephone. */
const mostAsked = 5
const fieldPaths = ['crewId', 'fromDay', 'workingDays', 'reason']

type Props = { list: RainOffList; crewId: string; day: string; backTo: string }

function useAskForm({ crewId, day, backTo }: Omit<Props, 'list'>) {
  const navigate = useNavigate()
  const toast = useToast()
  const ask = useAskRainOff()
  const [clientId] = useState(() => crypto.randomUUID())
  const [form, setForm] = useState({ crewId, fromDay: day, workingDays: 1, reason: '' })
  const set = (changes: Partial<typeof form>) => setForm((now) => ({ ...now, ...changes }))
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (ask.isPending) return
    ask.mutate(
      { clientId, ...form },
      {
        onSuccess: () => {
          toast(`Asked for ${formatDay(form.fromDay)}. The office has it.`)
          void navigate(backTo)
        },
      },
    )
  }
  return { ask, form, set, submit }
}

function AskForm({ list, ...props }: Props) {
  const { ask, form, set, submit } = useAskForm(props)
  const formRef = useFaultFocus(ask.error)
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="max-w-xl space-y-4">
      {list.crews.length > 1 ? (
        <Field label="Crew" error={issueAt(ask.error, 'crewId')}>
          <Select
            className="min-h-14"
            value={form.crewId}
            onChange={(e) => set({ crewId: e.target.value })}
          >
            {list.crews.map((crew) => (
              <option key={crew.id} value={crew.id}>
                {crew.name}
              </option>
            ))}
          </Select>
        </Field>
      ) : null}
      <Field label="First day lost" error={issueAt(ask.error, 'fromDay')}>
        <TextInput
          className="min-h-14"
          type="date"
          value={form.fromDay}
          onChange={(e) => set({ fromDay: e.target.value })}
        />
      </Field>
      <Field label="How long" error={issueAt(ask.error, 'workingDays')}>
        <Select
          className="min-h-14"
          value={String(form.workingDays)}
          onChange={(e) => set({ workingDays: Number(e.target.value) })}
        >
          {Array.from({ length: mostAsked }, (_, i) => (
            <option key={i} value={i + 1}>
              {workingDaysWords(i + 1)}
            </option>
          ))}
        </Select>
      </Field>
      <Field
        label="What it is like"
        hint="For the office; may stay empty."
        error={issueAt(ask.error, 'reason')}
      >
        <TextArea
          rows={2}
          maxLength={200}
          value={form.reason}
          onChange={(e) => set({ reason: e.target.value.replaceAll('\n', ' ') })}
        />
      </Field>
      <p>
        Nothing moves until the office says so. They see which jobs, customers and deliveries it
        touches.
      </p>
      <FormFailure error={ask.error} shownPaths={fieldPaths} />
      <Button type="submit" size="site" busy={ask.isPending} className="w-full sm:w-auto">
        Ask the office
      </Button>
      <RainOffHeightNote />
    </form>
  )
}

/** A leading hand asks for the crew's days to be moved on. */
export function AskRainOffPage() {
  const [search] = useSearchParams()
  const { data, error, refetch } = useQuery(rainOffQueries.list())
  const day = search.get('day')
  const backTo = `/today${day ? `?day=${day}` : ''}`
  const asked = search.get('crew')
  const crew = data?.crews.find((one) => one.id === asked) ?? data?.crews[0]
  return (
    <div className="site-screen">
      <PageHeader
        title="Ask for a rain-off"
        lead={crew?.name}
        actions={
          <Link to={backTo} className={buttonClass('plain', 'site')}>
            Back to the day
          </Link>
        }
      />
      {error ? (
        <ErrorState message={failureText(error) ?? error.message} onRetry={() => void refetch()} />
      ) : !data ? (
        <PageSkeleton />
      ) : crew ? (
        <AskForm list={data} crewId={crew.id} day={day ?? data.today} backTo={backTo} />
      ) : (
        <EmptyState title="You are in no crew today">Ask the office.</EmptyState>
      )}
    </div>
  )
}
