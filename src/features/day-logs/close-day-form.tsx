import type { FormEvent } from 'react'
import { loggedMinutes } from '../../../shared/day-logs/day-log-rules.ts'
import type { DayToClose, WriteDayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { formatQuarters } from '../../../shared/labour/format-hours.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { TextArea } from '../../ui/inputs.tsx'
import { Note } from '../../ui/states.tsx'
import { DelaysEditor } from './delays-editor.tsx'
import { LogClash } from './log-clash.tsx'
import { asWritten, peopleOf } from './log-form.ts'
import { PeopleHours } from './people-hours.tsx'
import { staleLogOf, useCloseDay } from './use-close-day.ts'

/** 'Set out the plates 1 of 1; Cut common rafters R1 12 of 24'. */
function tickedWords({ ticked }: DayToClose): string {
  return ticked
    .filter(({ doneCount }) => doneCount > 0)
    .map(({ title, doneCount, quantity }) => `${title} ${doneCount} of ${quantity}`)
    .join('; ')
}

type WordsProps = {
  day: DayToClose
  log: WriteDayLog
  error: unknown
  onChange: (part: Partial<WriteDayLog>) => void
}

function DoneAndRemarks({ day, log, error, onChange }: WordsProps) {
  const ticked = tickedWords(day)
  return (
    <Card className="space-y-4">
      <Field
        label="What was done"
        hint={ticked ? `Ticked already: ${ticked}.` : 'Nothing is ticked on this day.'}
        error={issueAt(error, 'done')}
      >
        <TextArea
          rows={2}
          maxLength={1000}
          value={log.done}
          onChange={(event) => onChange({ done: event.target.value })}
        />
      </Field>
      <Field
        label="Remarks"
        hint="What the next day or the office needs to know."
        error={issueAt(error, 'remarks')}
      >
        <TextArea
          rows={2}
          maxLength={1000}
          value={log.remarks}
          onChange={(event) => onChange({ remarks: event.target.value })}
        />
      </Field>
    </Card>
  )
}

function KeptNote({ onDrop }: { onDrop: () => void }) {
  return (
    <Note kind="caution" title="Not sent yet">
      <p className="text-base">What was put down before is still here, kept on this device.</p>
      <Button kind="quiet" size="site" className="px-0" onClick={onDrop}>
        Start again from the roster
      </Button>
    </Note>
  )
}

/** The whole log on one page, put down from the roster: often one press closes the day. */
export function CloseDayForm({ day, onDone }: { day: DayToClose; onDone: () => void }) {
  const { log, wasKept, change, save, startAgain } = useCloseDay(day, onDone)
  const formRef = useFaultFocus(save.error)
  const known = peopleOf(day)
  // Kept from before somebody else closed the day: compared at once, not after the next try.
  const isOvertaken = wasKept && day.log !== null && day.log.version !== log.version
  const theirs = staleLogOf(save.error) ?? (isOvertaken ? day.log : null)
  if (theirs)
    return (
      <LogClash
        theirs={theirs}
        own={log}
        known={known}
        busy={save.isPending}
        onKeepTheirs={() => startAgain(asWritten(theirs, day.day))}
        onUseOwn={() => save.mutate({ ...log, version: theirs.version })}
      />
    )
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!save.isPending) save.mutate(log)
  }
  const here = log.people.filter((row) => row.turnedUp).length
  const noteFaults = log.delays.map((_, i) => `delays.${i}.note`)
  const peopleFault = log.people.flatMap((_, i) => issueAt(save.error, `people.${i}.minutes`) ?? [])
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-4">
      {wasKept ? <KeptNote onDrop={() => startAgain()} /> : null}
      <PeopleHours
        rows={log.people}
        known={known}
        others={day.others}
        onChange={(people) => change({ people })}
      />
      <DelaysEditor
        delays={log.delays}
        peopleHere={here}
        onChange={(delays) => change({ delays })}
        issueAt={(path) => issueAt(save.error, path)}
      />
      <DoneAndRemarks day={day} log={log} error={save.error} onChange={change} />
      <div className="sticky bottom-16 space-y-2 rounded-md border border-rule bg-sheet p-3 lg:bottom-0">
        <FormFailure
          error={save.error}
          shownPaths={[...noteFaults, 'done', 'remarks'].filter(() => peopleFault.length === 0)}
        />
        <Button type="submit" size="site" className="w-full" busy={save.isPending}>
          {day.log ? 'Save the correction' : 'Close the day'}, {formatQuarters(loggedMinutes(log))}
        </Button>
      </div>
    </form>
  )
}
