import { ClipboardCheck } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { formatQuarters } from '../../../shared/labour/format-hours.ts'
import { useMay } from '../../lib/session.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'

/** The way to the day's log, under the day's work: to close it, or to see it closed. */
export function CloseDayKey({ sheet, today }: { sheet: DaySheet; today: string }) {
  const mayClose = useMay('day-log:write')
  const { log } = sheet
  const to = `/today/close/${sheet.bookingDayId}`
  if (log)
    return (
      <div className="print:hidden">
        <Note kind="done" title={`Day closed by ${log.loggedBy}: ${formatQuarters(log.minutes)}`}>
          {log.lostMinutes > 0 ? (
            <p className="text-base">{formatQuarters(log.lostMinutes)} lost.</p>
          ) : null}
          <Link to={to} className={`${buttonClass('plain', 'site')} mt-2 w-full sm:w-auto`}>
            See the log
          </Link>
        </Note>
      </div>
    )
  if (!mayClose || sheet.day > today) return null
  return (
    <Link to={to} className={`${buttonClass('primary', 'site')} w-full print:hidden`}>
      <ClipboardCheck size={22} aria-hidden />
      Close the day
    </Link>
  )
}
