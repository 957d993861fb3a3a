import type { Booking, CalendarCrew } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { Button } from '../../ui/button.tsx'
import { type BookingSide, sideOf } from './booking-steps.ts'

type Props = {
  name: string
  current: Booking
  mine: BookingSide
  crews: readonly CalendarCrew[]
  busy: boolean
  onMine: () => void
  onTheirs: () => void
}

type Row = { label: string; theirs: string; mine: string }

const daysInWords = (days: readonly Day[]): string => days.map(formatDay).join(', ')

function rowsOf({ current, mine, crews }: Props): Row[] {
  const crewName = (id: string) => crews.find((crew) => crew.id === id)?.name ?? current.crew.name
  const words = (side: BookingSide): Record<string, string> => ({
    Crew: crewName(side.crewId),
    Days: side.cancelled ? 'Cancelled' : daysInWords(side.days),
    'Pencilled or firm': side.state,
    ...(mine.startAt === undefined ? {} : { Start: side.startAt ?? 'the firm’s' }),
    ...(mine.gear === undefined ? {} : { Gear: side.gear || 'none' }),
  })
  const [there, wanted] = [words(sideOf(current)), words(mine)]
  return Object.keys(wanted).map((label) => ({
    label,
    theirs: there[label] ?? '',
    mine: wanted[label] ?? '',
  }))
}

/** Two people changed one booking: both versions side by side, and one is chosen. */
export function StaleAnswer(props: Props) {
  const { name, busy, onMine, onTheirs } = props
  const headClass = 'border-b border-rule p-2 text-left align-bottom font-extrabold'
  return (
    <div className="space-y-4">
      <p role="alert">
        Somebody else changed {name} while you did. Nothing of yours is written yet.
      </p>
      <table className="w-full table-fixed border-collapse">
        <thead>
          <tr>
            <th scope="col" className={`${headClass} w-1/4`}>
              <span className="sr-only">What</span>
            </th>
            <th scope="col" className={headClass}>
              There now
            </th>
            <th scope="col" className={headClass}>
              With your change
            </th>
          </tr>
        </thead>
        <tbody>
          {rowsOf(props).map(({ label, theirs, mine }) => (
            <tr key={label} className="border-b border-rule align-top">
              <th scope="row" className="p-2 text-left text-sm font-semibold text-ink-soft">
                {label}
              </th>
              <td className="p-2 [overflow-wrap:anywhere]">{theirs}</td>
              <td
                className={`p-2 [overflow-wrap:anywhere] ${mine === theirs ? '' : 'border-l-4 border-ochre font-semibold'}`}
              >
                {mine}
                {mine === theirs ? null : <span className="sr-only"> (differs)</span>}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="flex flex-wrap gap-2">
        <Button onClick={onTheirs}>Keep what is there now</Button>
        <Button kind="danger" busy={busy} onClick={onMine}>
          Make my change all the same
        </Button>
      </div>
    </div>
  )
}
