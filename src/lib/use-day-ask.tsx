import { type ReactNode, useState } from 'react'
import { formatDay } from '../../shared/calendar/days.ts'
import { Button } from '../ui/button.tsx'
import { Dialog } from '../ui/dialog.tsx'

/** Days that were meant, asked once each while the page is open. */
const meantDays = new Set<string>()

type DayAsk = { askFirst: (act: () => void) => void; question: ReactNode }

/** Holds back what is done on a day that is not today until it is said that this day is meant. */
export function useDayAsk(day: string, today: string): DayAsk {
  const [waiting, setWaiting] = useState<{ act: () => void } | null>(null)
  const askFirst = (act: () => void) => {
    if (day === today || meantDays.has(day)) act()
    else setWaiting({ act })
  }
  const dayWords = formatDay(day)
  const question = (
    <Dialog
      open={waiting !== null}
      onClose={() => setWaiting(null)}
      title={`This is ${dayWords}, not today`}
    >
      <p className="mb-4">
        Today is {formatDay(today)}. Count the piece on {dayWords}?
      </p>
      <div className="flex flex-wrap gap-3">
        <Button
          size="site"
          onClick={() => {
            meantDays.add(day)
            waiting?.act()
            setWaiting(null)
          }}
        >
          Count it on {dayWords}
        </Button>
        <Button kind="plain" size="site" onClick={() => setWaiting(null)}>
          Leave it
        </Button>
      </div>
    </Dialog>
  )
  return { askFirst, question }
}
