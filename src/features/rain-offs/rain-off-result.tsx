import { workAtHeight } from '../../../shared/marking/marking-card.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { RainOffPreview } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { Note } from '../../ui/states.tsx'
import { MovingBooking } from './moving-booking.tsx'
import { daysWords, isBookedOnLost, summaryWords } from './rain-off-words.ts'

/** No booked day says that a roof is fit to go up on. */
export function RainOffHeightNote() {
  return (
    <Note kind="stop" title="Working at height">
      <p>{workAtHeight} A booked day is not permission to go up.</p>
    </Note>
  )
}

/** What would move and whom it touches; nothing has moved yet. */
export function RainOffResult({ preview }: { preview: RainOffPreview }) {
  const { moves, stays, lostDays } = preview
  return (
    <section aria-labelledby="what-moves" className="space-y-3">
      <div>
        <h3 id="what-moves" className="text-lg font-extrabold">
          What moves
        </h3>
        <p aria-live="polite">
          Lost: {daysWords(lostDays)}.{' '}
          {moves.length > 0
            ? summaryWords(preview)
            : `Nothing of ${preview.crew.name} has to move.`}
        </p>
      </div>
      {moves.length > 0 && !isBookedOnLost(preview) ? (
        <Note
          kind="caution"
          title={`${preview.crew.name} has nothing booked on ${lostDays.length === 1 ? 'the day' : 'the days'} lost`}
        >
          What follows moves all the same. To leave it where it is, use up free days first.
        </Note>
      ) : null}
      {stays.length > 0 ? (
        <Note title="Stays where it is">
          <ul>
            {stays.map(({ bookingId, job, day }) => (
              <li key={`${bookingId} ${day}`}>
                {job}, {formatDay(day)}: work has begun.
              </li>
            ))}
          </ul>
        </Note>
      ) : null}
      {moves.length > 0 ? (
        <ol className="space-y-2">
          {moves.map((move) => (
            <MovingBooking key={move.bookingId} move={move} />
          ))}
        </ol>
      ) : null}
    </section>
  )
}
