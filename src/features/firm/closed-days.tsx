import { useState } from 'react'
import { formatDay, formatDayWithYear } from '../../../shared/calendar/days.ts'
import type { Closure } from '../../../shared/calendar/closures.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { useToast } from '../../ui/toast.tsx'

type Props = {
  closures: Closure[]
  onChange: (closures: Closure[]) => void
  issueAt: (path: string) => string | undefined
}

const none = { day: '', lastDay: '', name: '' }

function spanWords({ day, lastDay }: Closure): string {
  if (!lastDay || lastDay === day) return formatDayWithYear(day)
  const isSameYear = day.slice(0, 4) === lastDay.slice(0, 4)
  return `${isSameYear ? formatDay(day) : formatDayWithYear(day)} to ${formatDayWithYear(lastDay)}`
}

const inOrder = (closures: Closure[]) =>
  [...closures].sort((a, b) => a.day.localeCompare(b.day) || a.name.localeCompare(b.name))

function AddClosure({ onAdd }: { onAdd: (closure: Closure) => void }) {
  const [typed, setTyped] = useState(none)
  const isBackwards = typed.lastDay !== '' && typed.lastDay < typed.day
  const ready = typed.day !== '' && typed.name.trim() !== '' && !isBackwards
  const set = (change: Partial<typeof none>) => setTyped((now) => ({ ...now, ...change }))
  const add = () => {
    const { day, lastDay, name } = typed
    onAdd({ day, lastDay: lastDay || null, name: name.trim() })
    setTyped(none)
  }
  return (
    <div className="grid gap-3 sm:grid-cols-[1fr_1fr_2fr_auto] sm:items-start">
      <Field label="First day">
        <TextInput
          type="date"
          value={typed.day}
          onChange={(event) => set({ day: event.target.value })}
        />
      </Field>
      <Field
        label="Last day"
        hint="If it is more than one."
        error={isBackwards ? 'Before the first day.' : undefined}
      >
        <TextInput
          type="date"
          value={typed.lastDay}
          min={typed.day}
          onChange={(event) => set({ lastDay: event.target.value })}
        />
      </Field>
      <Field label="Why">
        <TextInput
          value={typed.name}
          maxLength={60}
          onChange={(event) => set({ name: event.target.value })}
        />
      </Field>
      <Button kind="plain" className="sm:mt-7" disabled={!ready} onClick={add}>
        Add
      </Button>
    </div>
  )
}

/** The firm's own shut days: a show day, a Christmas break. */
export function ClosedDays({ closures, onChange, issueAt }: Props) {
  const toast = useToast()
  const takeOut = (closure: Closure) => {
    const rest = closures.filter((other) => other !== closure)
    onChange(rest)
    toast(`${closure.name} taken out. Save the settings to keep that.`, {
      undo: () => onChange(inOrder([...rest, closure])),
    })
  }
  return (
    <div className="space-y-3">
      {closures.length === 0 ? (
        <p className="text-ink-soft">
          None yet. A Christmas break goes in once, first to last day.
        </p>
      ) : null}
      <ul>
        {closures.map((closure, i) => (
          <li
            key={`${closure.day} ${closure.name}`}
            className="flex flex-wrap items-center justify-between gap-x-3"
          >
            <span>
              {spanWords(closure)} · {closure.name}
              {['lastDay', 'name', 'day'].map((key) => {
                const issue = issueAt(`ownClosedDays.${i}.${key}`)
                return issue ? (
                  <span key={key} role="alert" className="block text-sm font-semibold text-stop">
                    {issue}
                  </span>
                ) : null
              })}
            </span>
            <Button
              kind="quiet"
              aria-label={`Take out ${closure.name}`}
              onClick={() => takeOut(closure)}
            >
              Take out
            </Button>
          </li>
        ))}
      </ul>
      <AddClosure onAdd={(closure) => onChange(inOrder([...closures, closure]))} />
    </div>
  )
}
