import { memo } from 'react'
import { isSamePx, roundPx, svgPoints } from '../../shared/drawing/drawing-geometry.ts'
import type { PlanMember } from '../../shared/drawing/plan-members.ts'

/** How a timber stands in the day's work; 'plain' where no day is shown. */
export type MemberState = 'plain' | 'due' | 'done' | 'rest'

const lineClasses: Record<MemberState, string> = {
  plain: 'stroke-ink-soft [stroke-width:1.25]',
  due: 'stroke-clay [stroke-width:4]',
  done: 'stroke-leaf [stroke-width:2.5] [stroke-dasharray:6_3]',
  rest: 'stroke-rule [stroke-width:1.25]',
}
const fillClasses: Record<MemberState, string> = {
  plain: 'fill-sheet',
  due: 'fill-clay',
  done: 'fill-sheet',
  rest: 'fill-sheet',
}
const stateWords: Record<MemberState, string> = {
  plain: '',
  due: ', due today',
  done: ', done',
  rest: '',
}

/** Drawn to its true thickness once that shows; as a line below. */
const outlineFromPx = 3.5

type Props = {
  member: PlanMember
  state: MemberState
  isSelected: boolean
  isTabStop: boolean
  isFocused: boolean
  isPickable: boolean
}

/** Each typed pause brings a new plan in which most timbers lie where they lay: those are not drawn again. */
export const PlanMemberShape = memo(MemberShape, (before, now) => {
  const { member: a, ...rest } = before
  const { member: b } = now
  const isSameState = (Object.keys(rest) as (keyof typeof rest)[]).every(
    (key) => before[key] === now[key],
  )
  return isSameState && isDrawnAlike(a, b)
})

const isDrawnAlike = (a: PlanMember, b: PlanMember): boolean =>
  a.mark === b.mark &&
  a.role === b.role &&
  a.thicknessPx === b.thicknessPx &&
  isSamePx(a.centre.from, b.centre.from) &&
  isSamePx(a.centre.to, b.centre.to) &&
  svgPoints(a.outline) === svgPoints(b.outline)

function MemberShape(props: Props) {
  const { member, state, isSelected, isFocused, isPickable } = props
  const pickProps = isPickable
    ? {
        role: 'button',
        tabIndex: props.isTabStop ? 0 : -1,
        'aria-label': `${member.mark}, ${roleWords(member.role)}${stateWords[state]}`,
        'aria-pressed': isSelected,
      }
    : {}
  return (
    <g data-mark={member.mark} className="outline-none" {...pickProps}>
      {isSelected || isFocused ? <MemberHalo member={member} isSelected={isSelected} /> : null}
      <MemberBody member={member} state={state} />
    </g>
  )
}

/** Chalk round the picked timber: solid when picked, dashed while only in focus. */
function MemberHalo({ member, isSelected }: { member: PlanMember; isSelected: boolean }) {
  return (
    <line
      {...centreProps(member)}
      strokeLinecap="round"
      strokeWidth={Math.max(9, member.thicknessPx + 7)}
      className={isSelected ? 'stroke-chalk' : 'stroke-chalk opacity-50'}
    />
  )
}

function MemberBody({ member, state }: { member: PlanMember; state: MemberState }) {
  // Hidden under the rafters that bear on it: dashed, as a drawing shows what lies below.
  if (member.role === 'underpurlin')
    return (
      <line
        {...centreProps(member)}
        className={`${lineClasses[state]} ${state === 'plain' || state === 'rest' ? '[stroke-width:2.5]!' : ''} [stroke-dasharray:9_4]!`}
      />
    )
  // Dashed and heavier, so that water's way down is told from a hip at a glance.
  if (member.role === 'valley' && state === 'plain')
    return member.thicknessPx < outlineFromPx ? (
      <line
        {...centreProps(member)}
        className="stroke-ink [stroke-width:2.25] [stroke-dasharray:10_3]"
      />
    ) : (
      <polygon
        points={svgPoints(member.outline)}
        strokeLinejoin="round"
        className="fill-paper stroke-ink [stroke-width:1.75] [stroke-dasharray:10_3]"
      />
    )
  if (member.thicknessPx < outlineFromPx)
    return <line {...centreProps(member)} className={lineClasses[state]} />
  const stroke = state === 'due' ? 'stroke-clay [stroke-width:1.5]' : lineClasses[state]
  return (
    <polygon
      points={svgPoints(member.outline)}
      strokeLinejoin="round"
      className={`${fillClasses[state]} ${stroke}`}
    />
  )
}

function centreProps({ centre }: PlanMember) {
  const { from, to } = centre
  return { x1: roundPx(from.x), y1: roundPx(from.y), x2: roundPx(to.x), y2: roundPx(to.y) }
}

/** 'crown-end' → 'crown end'. */
export function roleWords(role: string): string {
  return role.replaceAll('-', ' ')
}
