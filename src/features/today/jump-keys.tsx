import { ArrowDown } from 'lucide-react'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { isDone } from '../../../shared/day-sheets/day-pieces.ts'
import { Button } from '../../ui/button.tsx'

export const planPlaceId = ({ bookingDayId }: Pick<DaySheet, 'bookingDayId'>) =>
  `plan-${bookingDayId}`
export const taskPlaceId = ({ id }: { id: string }) => `task-${id}`

/** Goes there without a new address, so that the back key still leaves the page. */
function goTo(id: string): void {
  const place = document.getElementById(id)
  place?.scrollIntoView({ block: 'start' })
  place?.focus({ preventScroll: true })
}

/** From the top of a phone to the first thing not done, and to the plan below the work. */
export function JumpKeys({ sheet }: { sheet: DaySheet }) {
  const next = [...sheet.leftOver, ...sheet.tasks].find((task) => !isDone(task))
  if (!next && !sheet.revision) return null
  return (
    <div className="flex gap-2 lg:hidden print:hidden">
      {next ? (
        <Button size="site" className="min-w-0 flex-1 px-3" onClick={() => goTo(taskPlaceId(next))}>
          <ArrowDown size={22} aria-hidden className="shrink-0" />
          <span className="line-clamp-2 min-w-0 leading-tight">Next: {next.title}</span>
        </Button>
      ) : null}
      {sheet.revision ? (
        <Button kind="plain" size="site" onClick={() => goTo(planPlaceId(sheet))}>
          <ArrowDown size={22} aria-hidden className="shrink-0" />
          Plan
        </Button>
      ) : null}
    </div>
  )
}
