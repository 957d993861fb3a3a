import type {
  DayLog,
  ExpectedPerson,
  WriteDayLog,
} from '../../../shared/day-logs/day-log-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Note } from '../../ui/states.tsx'
import { LogView } from './log-view.tsx'

type Props = {
  theirs: DayLog
  own: WriteDayLog
  known: ReadonlyMap<string, ExpectedPerson>
  busy: boolean
  onKeepTheirs: () => void
  onUseOwn: () => void
}

/** Two people have closed the day: both logs, and one press for either. */
export function LogClash({ theirs, own, known, busy, onKeepTheirs, onUseOwn }: Props) {
  const ownShown = {
    ...own,
    people: own.people.map((row) => ({ ...row, name: known.get(row.personId)?.name ?? '' })),
  }
  return (
    <div className="space-y-4">
      <div role="alert">
        <Note kind="stop" title={`${theirs.loggedBy} has closed or corrected this day meanwhile`}>
          <p className="text-base">Both logs are below. Keep the one that is right.</p>
        </Note>
      </div>
      <div className="grid gap-4 lg:grid-cols-2">
        <Card className="space-y-3">
          <h2 className="text-lg font-extrabold">By {theirs.loggedBy}</h2>
          <LogView log={theirs} />
          <Button kind="plain" size="site" className="w-full" onClick={onKeepTheirs}>
            Keep this one
          </Button>
        </Card>
        <Card className="space-y-3">
          <h2 className="text-lg font-extrabold">Yours</h2>
          <LogView log={ownShown} />
          <Button size="site" className="w-full" busy={busy} onClick={onUseOwn}>
            Use yours
          </Button>
        </Card>
      </div>
    </div>
  )
}
