import { useMemo } from 'react'
import { bevelDialsOf } from '../../shared/drawing/bevel-dials.ts'
import { timberDrawing } from '../../shared/drawing/timber-drawing.ts'
import { handWords } from '../../shared/drawing/timber-points.ts'
import type { PosedMember } from '../../shared/drawing/timber-pose.ts'
import type { LengthUnits } from '../../shared/units/format-length.ts'
import { BevelDial } from './bevel-dial.tsx'
import { roleWords } from './plan-member-shape.tsx'
import { TimberSvg } from './timber-svg.tsx'
import { useWidth } from './use-width.ts'

type Props = {
  member: PosedMember
  units?: LengthUnits
  /** What bevels are set to. */
  roundDeg?: number
  /** Leave the dials out where the bevels are read elsewhere on the page. */
  showsDials?: boolean
}

const pageWidthPx = 680
const leastWidthPx = 300

/** One timber to scale from above and from its right side, with its measuring points and bevels. */
export function TimberDrawing({ member, units = 'mm', roundDeg = 0.5, showsDials = true }: Props) {
  const [boxRef, boxWidthPx] = useWidth<HTMLDivElement>(pageWidthPx)
  const widthPx = Math.max(boxWidthPx, leastWidthPx)
  const drawing = useMemo(() => timberDrawing(member, { widthPx, units }), [member, widthPx, units])
  const dials = useMemo(() => bevelDialsOf(member), [member])
  return (
    <figure className="m-0 flex min-w-0 flex-col gap-3">
      <figcaption className="font-semibold">{handWords(member)}</figcaption>
      <div ref={boxRef} className="min-w-0">
        <TimberSvg
          drawing={drawing}
          label={`${member.mark}, ${roleWords(member.role)}, to scale`}
        />
      </div>
      {showsDials && dials.length > 0 ? (
        <ul className="grid list-none grid-cols-[repeat(auto-fill,minmax(min(100%,18rem),1fr))] gap-2 p-0">
          {dials.map((dial) => (
            <li key={dial.letter}>
              <BevelDial dial={dial} roundDeg={roundDeg} />
            </li>
          ))}
        </ul>
      ) : null}
    </figure>
  )
}
