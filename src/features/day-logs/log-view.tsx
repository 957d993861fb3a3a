import type { DayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { loggedMinutes } from '../../../shared/day-logs/day-log-rules.ts'
import { delayReasonNames } from '../../../shared/day-logs/delay-words.ts'
import { formatQuarters } from '../../../shared/labour/format-hours.ts'

type Shown = Omit<DayLog, 'loggedBy' | 'loggedAt' | 'version'>

function Text({ name, text }: { name: string; text: string }) {
  if (text === '') return null
  return (
    <p className="whitespace-pre-line [overflow-wrap:anywhere]">
      <span className="font-semibold">{name}: </span>
      {text}
    </p>
  )
}

/** A log to read. */
export function LogView({ log }: { log: Shown }) {
  return (
    <div className="space-y-2 text-base">
      <ul className="list-none p-0">
        {log.people.map(({ personId, name, turnedUp, minutes }) => (
          <li key={personId} className="flex justify-between gap-4">
            <span className="min-w-0 [overflow-wrap:anywhere]">{name}</span>
            <span className="shrink-0 font-semibold tabular-nums">
              {turnedUp ? formatQuarters(minutes) : 'not here'}
            </span>
          </li>
        ))}
        <li className="flex justify-between gap-4 border-t border-rule font-extrabold">
          <span>Together</span>
          <span className="tabular-nums">{formatQuarters(loggedMinutes(log))}</span>
        </li>
      </ul>
      {log.delays.length > 0 ? (
        <ul className="list-disc pl-6">
          {log.delays.map(({ reason, note, lostMinutes }, i) => (
            <li key={`${i} ${reason}`}>
              {formatQuarters(lostMinutes)} lost: {delayReasonNames[reason].toLowerCase()}
              {note ? `, ${note}` : ''}
            </li>
          ))}
        </ul>
      ) : null}
      <Text name="Done" text={log.done} />
      <Text name="Remarks" text={log.remarks} />
    </div>
  )
}
