import { useDndMonitor } from '@dnd-kit/core'
import { Check, OctagonAlert, TriangleAlert } from 'lucide-react'
import { useEffect, useState } from 'react'
import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { nameOf } from './booking-steps.ts'
import { daysInWords, type Drag, type Landing, weightOf } from './drag-plan.ts'

const borders = { free: 'border-leaf', caution: 'border-ochre', clash: 'border-stop' }
const widthPx = 320
const gapPx = 16
const mostLines = 3

function pointOf(event: MouseEvent | TouchEvent): { x: number; y: number } | null {
  if (event instanceof MouseEvent) return { x: event.clientX, y: event.clientY }
  const touch = event.touches[0]
  return touch ? { x: touch.clientX, y: touch.clientY } : null
}

/** Where the pointer is, or by keys the cell the thing in hand stands on. */
function useGhostPlace(): { x: number; y: number } | null {
  const [at, setAt] = useState<{ x: number; y: number } | null>(null)
  useDndMonitor({
    onDragOver: ({ activatorEvent, over }) => {
      if (activatorEvent instanceof KeyboardEvent && over)
        setAt({ x: over.rect.left + over.rect.width, y: over.rect.top })
    },
  })
  useEffect(() => {
    const follow = (event: MouseEvent | TouchEvent) => setAt(pointOf(event))
    document.addEventListener('mousemove', follow)
    document.addEventListener('touchmove', follow)
    return () => {
      document.removeEventListener('mousemove', follow)
      document.removeEventListener('touchmove', follow)
    }
  }, [])
  return at
}

function Said({ landing }: { landing: Landing | null }) {
  if (!landing) return <p className="text-ink-soft">Carry it onto a crew’s day.</p>
  if (landing.isIdle) return <p className="text-ink-soft">Where it is now.</p>
  if (landing.clashes.length === 0)
    return (
      <p className="flex items-center gap-1 font-semibold text-leaf">
        <Check size={16} aria-hidden className="shrink-0" /> Nothing in the way
      </p>
    )
  const more = landing.clashes.length - mostLines
  return (
    <ul>
      {landing.clashes.slice(0, mostLines).map((clash) => {
        const Icon = clash.weight === 'clash' ? OctagonAlert : TriangleAlert
        return (
          <li
            key={clash.text}
            className={`flex items-start gap-1 font-semibold ${clash.weight === 'clash' ? 'text-stop' : 'text-ochre'}`}
          >
            <Icon size={16} aria-hidden className="mt-0.5 shrink-0" />
            <span className="line-clamp-4 min-w-0 [overflow-wrap:anywhere]">{clash.text}</span>
          </li>
        )
      })}
      {more > 0 ? <li>and {more} more</li> : null}
    </ul>
  )
}

/** What is in hand, where it would land, and what stands in the way there. */
export function DragGhost(props: { calendar: Calendar; drag: Drag; landing: Landing | null }) {
  const { calendar, drag, landing } = props
  const at = useGhostPlace()
  if (!at) return null
  const crew = calendar.crews.find((one) => one.id === landing?.crewId)
  const title =
    drag.kind === 'job' ? `${drag.job.number} ${drag.job.title}` : nameOf(drag.bar.booking)
  const isRightFull = at.x + gapPx + widthPx > window.innerWidth
  const weight = landing && !landing.isIdle ? weightOf(landing) : null
  return (
    <div
      aria-hidden
      className={`pointer-events-none fixed z-50 rounded-md border-4 bg-sheet p-2 text-sm leading-snug shadow-float ${weight ? borders[weight] : 'border-ink-soft'}`}
      style={{
        width: Math.min(widthPx, window.innerWidth - gapPx),
        left: Math.max(4, isRightFull ? at.x - gapPx - widthPx : at.x + gapPx),
        top: Math.min(at.y + gapPx, window.innerHeight - 150),
      }}
    >
      <p className="line-clamp-2 font-extrabold [overflow-wrap:anywhere]">{title}</p>
      {landing ? (
        <p>
          {crew?.name}, {daysInWords(landing.days)}
        </p>
      ) : null}
      <Said landing={landing} />
    </div>
  )
}
