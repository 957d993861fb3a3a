import { X } from 'lucide-react'
import type { WriteDayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { type DelayReason, delayReasons } from '../../../shared/day-logs/delay-reasons.ts'
import { delayReasonNames } from '../../../shared/day-logs/delay-words.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { HoursStepper } from './hours-stepper.tsx'

type Delay = WriteDayLog['delays'][number]
type Props = {
  delays: Delay[]
  /** How many are there: an hour of each is where a delay starts. */
  peopleHere: number
  onChange: (delays: Delay[]) => void
  issueAt: (path: string) => string | undefined
}

const stepMinutes = 30
const mostMinutes = 100 * 60
const isReason = (value: string): value is DelayReason =>
  (delayReasons as readonly string[]).includes(value)

type RowProps = {
  delay: Delay
  index: number
  issueAt: Props['issueAt']
  onChange: (delay: Delay) => void
  onDrop: () => void
}

function DelayRow({ delay, index, issueAt, onChange, onDrop }: RowProps) {
  const name = delayReasonNames[delay.reason]
  return (
    <li className="space-y-2 py-3">
      <div className="flex flex-wrap items-center justify-between gap-2">
        <h3 className="text-lg font-semibold">{name}</h3>
        <div className="flex items-center gap-2">
          <HoursStepper
            label={`Hours lost: ${name}`}
            minutes={delay.lostMinutes}
            stepMinutes={stepMinutes}
            leastMinutes={stepMinutes}
            mostMinutes={mostMinutes}
            onChange={(lostMinutes) => onChange({ ...delay, lostMinutes })}
          />
          <Button kind="plain" size="site" aria-label={`Take out: ${name}`} onClick={onDrop}>
            <X size={22} aria-hidden />
          </Button>
        </div>
      </div>
      <Field
        label={delay.reason === 'other' ? 'What it was' : 'In a few words (may stay empty)'}
        error={issueAt(`delays.${index}.note`)}
      >
        <TextInput
          className="min-h-14"
          maxLength={300}
          value={delay.note}
          onChange={(event) => onChange({ ...delay, note: event.target.value })}
        />
      </Field>
    </li>
  )
}

/** What held the day up, and the hours of everybody together that it cost. */
export function DelaysEditor({ delays, peopleHere, onChange, issueAt }: Props) {
  const add = (reason: DelayReason) =>
    onChange([...delays, { reason, note: '', lostMinutes: Math.max(1, peopleHere) * 60 }])
  return (
    <Card aria-labelledby="held-up">
      <h2 id="held-up" className="text-lg font-extrabold">
        Held up
      </h2>
      <p className="text-base">Hours lost are of everybody together.</p>
      <ul className="list-none divide-y divide-rule p-0">
        {delays.map((delay, index) => (
          <DelayRow
            key={`${index} ${delay.reason}`}
            delay={delay}
            index={index}
            issueAt={issueAt}
            onChange={(next) => onChange(delays.map((one, i) => (i === index ? next : one)))}
            onDrop={() => onChange(delays.filter((_, i) => i !== index))}
          />
        ))}
      </ul>
      <Field label="Add what held you up" className="mt-2 max-w-sm">
        <Select
          className="min-h-14"
          value=""
          onChange={(event) => (isReason(event.target.value) ? add(event.target.value) : undefined)}
        >
          <option value="">{delays.length === 0 ? 'Nothing' : 'Nothing more'}</option>
          {delayReasons.map((reason) => (
            <option key={reason} value={reason}>
              {delayReasonNames[reason]}
            </option>
          ))}
        </Select>
      </Field>
    </Card>
  )
}
