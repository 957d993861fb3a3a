import { memo, useRef, useState, type KeyboardEvent, type MouseEvent } from 'react'
import { isSamePx, roundPx } from '../../shared/drawing/drawing-geometry.ts'
import type { PlanDrawing } from '../../shared/drawing/plan-drawing.ts'
import type { PlanLabel } from '../../shared/drawing/plan-labels.ts'
import { planMemberAt, type PlanMember } from '../../shared/drawing/plan-members.ts'
import { FineLine } from './plan-surround.tsx'
import { PlanMemberShape, type MemberState } from './plan-member-shape.tsx'

type Props = {
  drawing: PlanDrawing
  stateOf: (mark: string) => MemberState
  selected: string | null
  onPick: ((mark: string) => void) | undefined
}

const fingerReachPx = 22
const drawingOrder: Record<MemberState, number> = { rest: 0, plain: 0, done: 1, due: 2 }

/**
 * Every timber with its mark. One stop for the Tab key; arrows go from timber to timber, Enter picks.
 * A tap picks the nearest timber, since a rafter is thinner than a finger.
 */
export function PlanTimbers({ drawing, stateOf, selected, onPick }: Props) {
  const groupRef = useRef<SVGGElement>(null)
  const [focused, setFocused] = useState<string | null>(null)
  const { members } = drawing
  const tabStop = members.some((m) => m.mark === selected) ? selected : members[0]?.mark
  const moveFocus = (mark: string, step: number) => {
    const at = members.findIndex((member) => member.mark === mark)
    const next = members[(at + step + members.length) % members.length]
    if (next) focusMark(groupRef.current, next.mark)
  }
  const onKeyDown = (event: KeyboardEvent<SVGGElement>) => {
    const step = keySteps[event.key]
    const picks = event.key === 'Enter' || event.key === ' '
    const mark = markOf(event.target)
    if (mark === null || (step === undefined && !picks)) return
    event.preventDefault()
    if (step !== undefined) moveFocus(mark, step)
    else onPick?.(mark)
  }
  const onClick = (event: MouseEvent<SVGGElement>) => {
    const mark = markOfClick(event, drawing)
    if (mark !== null) onPick?.(mark)
  }
  const drawn = [...members].sort((a, b) => order(a, stateOf) - order(b, stateOf))
  const leaders = drawing.labels.flatMap((label) => (label.leader ? [label.leader] : []))
  return (
    <g
      ref={groupRef}
      onClick={onPick ? onClick : undefined}
      onKeyDown={onPick ? onKeyDown : undefined}
      onFocus={onPick ? (event) => setFocused(markOf(event.target)) : undefined}
      onBlur={onPick ? () => setFocused(null) : undefined}
      className={onPick && 'cursor-pointer'}
    >
      {onPick ? <rect width="100%" height="100%" className="fill-transparent" /> : null}
      {drawn.map((member) => (
        <PlanMemberShape
          key={member.mark}
          member={member}
          state={stateOf(member.mark)}
          isSelected={member.mark === selected}
          isFocused={member.mark === focused}
          isTabStop={member.mark === tabStop}
          isPickable={onPick !== undefined}
        />
      ))}
      {leaders.map((leader, i) => (
        <FineLine key={i} line={leader} />
      ))}
      {drawing.labels.map((label) => (
        <MarkText
          key={label.mark}
          label={label}
          state={stateOf(label.mark)}
          isSelected={label.mark === selected}
        />
      ))}
    </g>
  )
}

const keySteps: Record<string, number> = {
  ArrowRight: 1,
  ArrowDown: 1,
  ArrowLeft: -1,
  ArrowUp: -1,
}

const textClasses: Record<MemberState, string> = {
  plain: 'fill-ink font-semibold',
  due: 'fill-clay font-extrabold',
  done: 'fill-leaf font-extrabold',
  rest: 'fill-ink-soft font-semibold',
}

type MarkTextProps = { label: PlanLabel; state: MemberState; isSelected: boolean }

const isSameText = (a: PlanLabel, b: PlanLabel): boolean =>
  a.text === b.text &&
  a.sizePx === b.sizePx &&
  a.widthPx === b.widthPx &&
  a.heightPx === b.heightPx &&
  roundPx(a.angleDeg) === roundPx(b.angleDeg) &&
  isSamePx(a.centre, b.centre)

const MarkText = memo(
  MarkPatch,
  (before, now) =>
    before.state === now.state &&
    before.isSelected === now.isSelected &&
    isSameText(before.label, now.label),
)

/** On a patch that breaks its timber, as a number breaks a contour. */
function MarkPatch({ label, state, isSelected }: MarkTextProps) {
  const { centre, angleDeg, widthPx, heightPx, sizePx } = label
  return (
    <g
      aria-hidden="true"
      transform={`translate(${roundPx(centre.x)} ${roundPx(centre.y)}) rotate(${roundPx(angleDeg)})`}
      className="pointer-events-none"
    >
      <rect
        x={1 - widthPx / 2}
        y={-heightPx / 2}
        width={widthPx - 2}
        height={heightPx}
        rx={2}
        className="fill-sheet"
      />
      <text
        dy="0.35em"
        textAnchor="middle"
        fontSize={sizePx}
        className={isSelected ? 'fill-chalk font-extrabold' : textClasses[state]}
      >
        {label.text}
      </text>
    </g>
  )
}

/** Underpurlins lie under the rafters, collar ties and boards over nothing; what is due comes last. */
function order(member: PlanMember, stateOf: Props['stateOf']): number {
  return drawingOrder[stateOf(member.mark)] + (member.role === 'underpurlin' ? -0.5 : 0)
}

function focusMark(group: SVGGElement | null, mark: string): void {
  const shapes = [...(group?.querySelectorAll<SVGGElement>('[data-mark]') ?? [])]
  shapes.find((shape) => shape.getAttribute('data-mark') === mark)?.focus()
}

const markOf = (target: EventTarget): string | null =>
  (target instanceof Element ? target.closest('[data-mark]') : null)?.getAttribute('data-mark') ??
  null

/** The timber under the finger; a click without a place (a screen reader's) means its own target. */
function markOfClick(event: MouseEvent<SVGGElement>, drawing: PlanDrawing): string | null {
  const box = event.currentTarget.ownerSVGElement?.getBoundingClientRect()
  const own = markOf(event.target)
  if (!box || box.width === 0 || event.detail === 0) return own
  const pxPerScreenPx = drawing.view.widthPx / box.width
  const point = {
    x: (event.clientX - box.left) * pxPerScreenPx,
    y: (event.clientY - box.top) * pxPerScreenPx,
  }
  return planMemberAt(drawing.members, point, fingerReachPx * pxPerScreenPx)?.mark ?? own
}
