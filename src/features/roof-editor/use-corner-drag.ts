import { type RefObject, useEffect, useRef, useState } from 'react'
import { type PlanView, roofPointAt } from '../../../shared/drawing/plan-view.ts'
import { type Snapped, snapCorner } from '../../../shared/outline/snap-corner.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'

/** A corner under way: where it would come to rest, and what it is lined up with. */
export type CornerDrag = Snapped & { corner: number }

type Options = {
  view: PlanView
  outline: readonly Point2[]
  gridMm: number
  onDrop: (corner: number, at: Point2) => void
  onTap: (corner: number) => void
}

const handleReachPx = 22
const snapReachPx = 10
const dragFromPx = { mouse: 3, finger: 8 }

/**
 * Drags the corners of an outline by mouse, pen or finger. Only the outline under way is drawn meanwhile;
 * letting go is one change, Esc none.
 */
export function useCornerDrag(
  svgRef: RefObject<SVGSVGElement | null>,
  options: Options,
): CornerDrag | null {
  const now = useRef(options)
  const [drag, setDrag] = useState<(CornerDrag & { of: readonly Point2[] }) | null>(null)
  useEffect(() => {
    now.current = options
  })
  useEffect(() => {
    const svg = svgRef.current
    if (!svg) return
    return listenToCorners(svg, () => now.current, setDrag)
  }, [svgRef])
  // After letting go it stays drawn where it was dropped until the outline itself has followed.
  return drag && drag.of === options.outline ? drag : null
}

type Held = { corner: number; pointerId: number; from: Point2; grip: Point2; isMoved: boolean }
type SetDrag = (drag: (CornerDrag & { of: readonly Point2[] }) | null) => void

function listenToCorners(svg: SVGSVGElement, options: () => Options, setDrag: SetDrag) {
  let held: Held | null = null
  let last: CornerDrag | null = null
  const letGo = () => {
    held = null
    last = null
  }
  const cancel = () => {
    letGo()
    setDrag(null)
  }
  const onDown = (event: PointerEvent) => {
    if (event.button !== 0 || held) return
    const at = pointOfEvent(svg, options().view, event)
    const corner = at && cornerUnder(options(), at.drawn)
    if (!at || corner === null) return
    const own = options().outline[corner]
    if (!own) return
    // The plan's own window must not take this for a drag of the whole plan.
    event.stopPropagation()
    event.preventDefault()
    svg.setPointerCapture(event.pointerId)
    svg.querySelector<SVGElement>(`[data-corner="${corner}"]`)?.focus({ preventScroll: true })
    const grip = { x: own.x - at.mm.x, y: own.y - at.mm.y }
    const from = { x: event.clientX, y: event.clientY }
    held = { corner, pointerId: event.pointerId, from, grip, isMoved: false }
  }
  // A finger on a corner does not scroll the page; anywhere else on the plan it does.
  const onTouch = (event: TouchEvent) => {
    const [finger] = event.touches
    const at = finger && pointOfEvent(svg, options().view, finger)
    if (at && event.touches.length === 1 && cornerUnder(options(), at.drawn) !== null) {
      event.preventDefault()
    }
  }
  const onMove = (event: PointerEvent) => {
    if (held?.pointerId !== event.pointerId) return
    const apart = Math.hypot(event.clientX - held.from.x, event.clientY - held.from.y)
    if (!held.isMoved && apart < dragFromPx[event.pointerType === 'mouse' ? 'mouse' : 'finger'])
      return
    held.isMoved = true
    const { view, outline, gridMm } = options()
    const at = pointOfEvent(svg, view, event)
    if (!at) return
    const to = { x: at.mm.x + held.grip.x, y: at.mm.y + held.grip.y }
    const reachMm = snapReachPx / view.pxPerMm
    last = { corner: held.corner, ...snapCorner(outline, held.corner, to, { gridMm, reachMm }) }
    setDrag({ ...last, of: outline })
  }
  const onUp = (event: PointerEvent) => {
    if (held?.pointerId !== event.pointerId) return
    const { corner, isMoved } = held
    const dropped = last
    letGo()
    if (!isMoved) options().onTap(corner)
    else if (dropped) options().onDrop(corner, dropped.at)
  }
  const onKey = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || !held) return
    event.stopPropagation()
    cancel()
  }
  svg.addEventListener('touchstart', onTouch, { passive: false })
  svg.addEventListener('pointerdown', onDown)
  svg.addEventListener('pointermove', onMove)
  svg.addEventListener('pointerup', onUp)
  svg.addEventListener('pointercancel', cancel)
  window.addEventListener('keydown', onKey, { capture: true })
  return () => {
    svg.removeEventListener('touchstart', onTouch)
    svg.removeEventListener('pointerdown', onDown)
    svg.removeEventListener('pointermove', onMove)
    svg.removeEventListener('pointerup', onUp)
    svg.removeEventListener('pointercancel', cancel)
    window.removeEventListener('keydown', onKey, { capture: true })
  }
}

/** Where the pointer is, in px of the drawing and in mm of the roof. */
type OnScreen = { clientX: number; clientY: number }

function pointOfEvent(svg: SVGSVGElement, view: PlanView, event: OnScreen) {
  const { left, top, width } = svg.getBoundingClientRect()
  if (width === 0) return null
  const scale = view.widthPx / width
  const drawn = { x: (event.clientX - left) * scale, y: (event.clientY - top) * scale }
  return { drawn, mm: roofPointAt(view, drawn) }
}

/** The corner a finger meant: the nearest within reach. */
function cornerUnder({ view, outline }: Options, at: Point2): number | null {
  let nearest: number | null = null
  let leastPx = handleReachPx
  for (const [i, corner] of outline.entries()) {
    const place = view.place(corner)
    const offPx = Math.hypot(place.x - at.x, place.y - at.y)
    if (offPx > leastPx) continue
    nearest = i
    leastPx = offPx
  }
  return nearest
}
