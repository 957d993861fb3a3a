import { Ruler } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { useMay } from '../../lib/session.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'

/** Whether the lengths are from plan or the plates have been measured. */
export function PlatesNote({ sheet }: { sheet: DaySheet }) {
  const mayMeasure = useMay('plate-check:write')
  const { plates, revision } = sheet
  if (!revision) return null
  const to = `/today/plates/${sheet.bookingDayId}?revision=${revision.id}&day=${sheet.day}`
  const link = mayMeasure ? (
    <Link to={to} className={`${buttonClass('plain', 'site')} mt-2 w-full sm:w-auto print:hidden`}>
      <Ruler size={22} aria-hidden />
      {plates ? 'See or measure again' : 'Measure the plates'}
    </Link>
  ) : null
  if (!plates)
    return (
      <Note kind="caution" title="From plan, plates not measured">
        <p className="text-base">
          Check sides and diagonals before the first cut: every length here is from the plan.
        </p>
        {link}
      </Note>
    )
  return (
    <Note
      kind={plates.differing > 0 ? 'stop' : 'done'}
      title={
        plates.differing > 0
          ? `Plates measured: ${plates.differing} ${plates.differing === 1 ? 'length' : 'lengths'} more than 5 mm off plan`
          : 'Plates measured, within 5 mm of plan'
      }
    >
      <p className="text-base">
        By {plates.takenBy}.
        {plates.differing > 0
          ? ' Lengths here are still those of the plan. Tell the office before you cut.'
          : ''}
      </p>
      {link}
    </Note>
  )
}
