import { useDraggable } from '@dnd-kit/core'
import { BadgeCheck, Check, OctagonAlert, Pencil, TriangleAlert } from 'lucide-react'
import { type KeyboardEvent, memo, useMemo } from 'react'
import { clashShortWords } from '../../../shared/clashes/clash-words.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { cellClass } from './booking-cell.tsx'
import { FlagLine } from '../../ui/flag-line.tsx'
import { lengthWords } from './booking-flags.tsx'
import type { Bar } from './crew-weeks-layout.ts'
import { daysInWords } from './drag-plan.ts'

type Props = {
  bar: Bar
  mayEdit: boolean
  isFirstStop: boolean
  isInHand: boolean
  onOpen: (bar: Bar, anchor: HTMLElement) => void
  onKey: (bar: Bar, event: KeyboardEvent<HTMLElement>) => void
  onFocus: (key: string) => void
}

/** What is amiss on the days of a bar, each thing once. */
function flagsOf({ booking, shown }: Bar) {
  const flags = booking.days.filter((d) => shown.includes(d.day)).flatMap((d) => d.flags)
  const unique = flags.filter((flag, i) => flags.findIndex((f) => f.code === flag.code) === i)
  return unique.filter((flag) => flag.code !== 'too-short')
}

function labelOf(bar: Bar): string {
  const { booking, stretch } = bar
  const flags = flagsOf(bar).map((flag) => clashShortWords[flag.code])
  const length = lengthWords(booking)
  return [
    `${booking.job.title}, ${booking.job.number}`,
    booking.crew.name,
    daysInWords(stretch),
    booking.state,
    ...(length ? [length] : []),
    ...flags,
  ].join(', ')
}

const BarText = memo(function BarText({ bar }: { bar: Bar }) {
  const { booking } = bar
  const flags = flagsOf(bar)
  const length = lengthWords(booking)
  const worked = booking.days.filter((d) => d.worked && bar.shown.includes(d.day))
  const lastWorked = worked[worked.length - 1]
  const isClash = flags.some((flag) => flag.weight === 'clash')
  const StateIcon = booking.state === 'firm' ? BadgeCheck : Pencil
  const WarnIcon = isClash ? OctagonAlert : TriangleAlert
  return (
    <span className="block p-1 text-xs leading-tight @min-[8rem]:text-sm @min-[8rem]:leading-snug">
      <span className="flex flex-wrap items-center gap-1 text-ink-soft">
        {booking.glyph ? <RoofGlyph glyph={booking.glyph} sizePx={24} /> : null}
        <StateIcon size={14} aria-hidden className="shrink-0" />
        <span className="hidden @min-[8rem]:inline">{booking.state}</span>
        {flags.length > 0 || length ? (
          <WarnIcon
            size={14}
            aria-hidden
            className={`shrink-0 @min-[8rem]:hidden ${isClash ? 'text-stop' : 'text-ochre'}`}
          />
        ) : null}
        <span className="ml-auto hidden @min-[11rem]:inline">{booking.job.number}</span>
      </span>
      <span className="line-clamp-2 font-semibold [overflow-wrap:anywhere]">
        {booking.job.title}
      </span>
      {lastWorked ? (
        <span className="flex items-center gap-0.5 text-leaf">
          <Check size={14} aria-hidden className="shrink-0" />
          <span className="hidden @min-[8rem]:inline">
            worked
            {lastWorked.day === bar.stretch[bar.stretch.length - 1]
              ? ''
              : ` to ${formatDay(lastWorked.day)}`}
          </span>
        </span>
      ) : null}
      <span className="hidden @min-[8rem]:block">
        {flags.slice(0, 2).map((flag) => (
          <FlagLine key={flag.code} weight={flag.weight}>
            {clashShortWords[flag.code]}
          </FlagLine>
        ))}
        {length ? <FlagLine weight="caution">{length}</FlagLine> : null}
      </span>
    </span>
  )
})

const pullClass = 'absolute inset-y-0 w-2 cursor-ew-resize'

/** A booking's run of days: dragged by its middle, pulled by its ends, opened by a press. */
export function CrewWeeksBar(props: Props) {
  const { bar, mayEdit, isFirstStop, isInHand, onOpen, onKey, onFocus } = props
  const { booking, stretch, fromColumn, toColumn, lane, goesOnBefore, goesOnAfter } = bar
  const isAllWorked = stretch.every((day) => booking.days.some((d) => d.day === day && d.worked))
  const mayDrag = mayEdit && !isAllWorked
  const label = useMemo(() => labelOf(bar), [bar])
  const { attributes, listeners, setNodeRef } = useDraggable({
    id: `bar ${bar.key}`,
    data: { kind: 'bar', bar },
    disabled: !mayDrag,
    attributes: { roleDescription: 'booking', tabIndex: isFirstStop ? 0 : -1 },
  })
  const { onKeyDown: takeByKey, ...pointers } = listeners ?? {}
  return (
    <div
      {...attributes}
      {...pointers}
      ref={setNodeRef}
      aria-disabled={undefined}
      aria-pressed={undefined}
      aria-label={label}
      data-bar={bar.key}
      data-booking={booking.id}
      data-column={fromColumn}
      data-end-column={toColumn}
      onClick={(event) => onOpen(bar, event.currentTarget)}
      onFocus={() => onFocus(bar.key)}
      onKeyDown={(event) => {
        if (event.code === 'Space' && mayDrag) takeByKey?.(event)
        else onKey(bar, event)
      }}
      className={`@container relative z-[1] mx-[3px] my-[3px] min-w-0 select-none overflow-hidden ${cellClass(booking.state)} ${mayDrag ? 'cursor-grab' : 'cursor-pointer'} ${goesOnBefore ? 'rounded-l-none border-l-0' : ''} ${goesOnAfter ? 'rounded-r-none border-r-0' : ''} ${isInHand ? 'opacity-50' : ''}`}
      style={{ gridColumn: `${fromColumn + 2} / ${toColumn + 3}`, gridRow: lane + 1 }}
    >
      <BarText bar={bar} />
      {mayDrag && !goesOnBefore ? (
        <span aria-hidden data-pull="first" className={`${pullClass} left-0`} />
      ) : null}
      {mayDrag && !goesOnAfter ? (
        <span aria-hidden data-pull="last" className={`${pullClass} right-0`} />
      ) : null}
    </div>
  )
}
