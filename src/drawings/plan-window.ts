import { type PlanView, roofPointAt } from '../../shared/drawing/plan-view.ts'
import type { Point2 } from '../../shared/roof/roof-types.ts'

/** What the window shows now. */
export type PlanShown = { view: PlanView | null; zoom: number; maxZoom: number }

export type PlanWindow = {
  /** Draws larger or smaller about the middle, or brings a point of the roof there. */
  zoomTo: (zoom: number, middle?: Point2) => void
  /** Puts the held point back in its place after the drawing has changed its size. */
  settle: () => void
  close: () => void
}

/** In screen px. */
type Place = { x: number; y: number }

const wheelShare = 0.002
const dragFromPx = 4

/**
 * A scrolling window over a plan: pinch, Ctrl and wheel, the keys + − 0; drawn larger, it is dragged by
 * the mouse and scrolled by finger or arrows.
 */
export function openPlanWindow(
  box: HTMLElement,
  shown: () => PlanShown,
  setZoom: (zoom: number) => void,
): PlanWindow {
  let held: { point: Point2; at: Place } | null = null
  const middleOf = () => {
    const { left, top } = box.getBoundingClientRect()
    return { x: left + box.clientWidth / 2, y: top + box.clientHeight / 2 }
  }
  const hold = (from: Place, at: Place = from) => {
    const point = pointUnder(box, shown(), from)
    held = point && { point, at }
  }
  const zoomAbout = (zoom: number, place: Place) => {
    hold(place)
    setZoom(withinZoom(zoom, shown()))
  }
  const settle = () => {
    const place = held && placeOf(box, shown(), held.point)
    if (!held || !place) return
    box.scrollLeft += place.x - held.at.x
    box.scrollTop += place.y - held.at.y
  }
  const stops = [
    listenToPinch(box, shown, (zoom, from, at) => {
      hold(from, at)
      setZoom(withinZoom(zoom, shown()))
      settle()
    }),
    listenToWheel(box, (share, place) => zoomAbout(shown().zoom * share, place)),
    listenToKeys(box, (share) => zoomAbout(share === 0 ? 1 : shown().zoom * share, middleOf())),
    listenToDrag(box, () => (held = null)),
  ]
  return {
    zoomTo: (zoom, middle) => {
      if (middle) held = { point: middle, at: middleOf() }
      else hold(middleOf())
      setZoom(withinZoom(zoom, shown()))
    },
    settle,
    close: () => stops.forEach((stop) => stop()),
  }
}

function withinZoom(zoom: number, { maxZoom }: PlanShown): number {
  return Math.min(Math.max(zoom, 1), maxZoom)
}

/** Screen px to px of the drawing, which may be shown larger than it was laid out. */
function drawnScale(box: HTMLElement, view: PlanView) {
  const rect = box.querySelector('svg')?.getBoundingClientRect()
  return rect && rect.width > 0 ? { rect, scale: rect.width / view.widthPx } : null
}

function pointUnder(box: HTMLElement, { view }: PlanShown, place: Place): Point2 | null {
  const drawn = view && drawnScale(box, view)
  if (!view || !drawn) return null
  const { rect, scale } = drawn
  return roofPointAt(view, { x: (place.x - rect.left) / scale, y: (place.y - rect.top) / scale })
}

function placeOf(box: HTMLElement, { view }: PlanShown, point: Point2): Place | null {
  const drawn = view && drawnScale(box, view)
  if (!view || !drawn) return null
  const { rect, scale } = drawn
  const at = view.place(point)
  return { x: rect.left + at.x * scale, y: rect.top + at.y * scale }
}

function listenToWheel(box: HTMLElement, onZoom: (share: number, place: Place) => void) {
  const onWheel = (event: WheelEvent) => {
    // Alone the wheel scrolls the page; a trackpad's pinch comes as a wheel with Ctrl.
    if (!event.ctrlKey && !event.metaKey) return
    event.preventDefault()
    onZoom(Math.exp(-event.deltaY * wheelShare), { x: event.clientX, y: event.clientY })
  }
  box.addEventListener('wheel', onWheel, { passive: false })
  return () => box.removeEventListener('wheel', onWheel)
}

const keyShares: Record<string, number> = { '+': 1.5, '=': 1.5, '-': 1 / 1.5, '0': 0 }

function listenToKeys(box: HTMLElement, onZoom: (share: number) => void) {
  const onKey = (event: KeyboardEvent) => {
    const share = keyShares[event.key]
    if (share === undefined || event.ctrlKey || event.metaKey || event.altKey) return
    event.preventDefault()
    onZoom(share)
  }
  box.addEventListener('keydown', onKey)
  return () => box.removeEventListener('keydown', onKey)
}

/** Two fingers: how far apart, and where between them. */
function fingersOf({ touches }: TouchEvent) {
  const [a, b] = [touches[0], touches[1]]
  if (!a || !b) return null
  return {
    apartPx: Math.hypot(a.clientX - b.clientX, a.clientY - b.clientY) || 1,
    middle: { x: (a.clientX + b.clientX) / 2, y: (a.clientY + b.clientY) / 2 },
  }
}

function listenToPinch(
  box: HTMLElement,
  shown: () => PlanShown,
  onPinch: (zoom: number, from: Place, at: Place) => void,
) {
  let start: { apartPx: number; middle: Place; zoom: number } | null = null
  const onStart = (event: TouchEvent) => {
    const fingers = fingersOf(event)
    start = fingers && { ...fingers, zoom: shown().zoom }
  }
  const onMove = (event: TouchEvent) => {
    const fingers = fingersOf(event)
    if (!fingers || !start) return
    event.preventDefault()
    onPinch((start.zoom * fingers.apartPx) / start.apartPx, start.middle, fingers.middle)
    start = { ...start, middle: fingers.middle }
  }
  const onEnd = () => (start = null)
  box.addEventListener('touchstart', onStart, { passive: true })
  box.addEventListener('touchmove', onMove, { passive: false })
  box.addEventListener('touchend', onEnd)
  return () => {
    box.removeEventListener('touchstart', onStart)
    box.removeEventListener('touchmove', onMove)
    box.removeEventListener('touchend', onEnd)
  }
}

/** The mouse drags what is larger than its window; the click that ends a drag picks nothing. */
function listenToDrag(box: HTMLElement, onScroll: () => void) {
  let start: { x: number; y: number; left: number; top: number } | null = null
  let hasDragged = false
  const onDown = (event: PointerEvent) => {
    onScroll()
    hasDragged = false
    const isLarger = box.scrollWidth > box.clientWidth || box.scrollHeight > box.clientHeight
    if (event.pointerType !== 'mouse' || event.button !== 0 || !isLarger) return
    start = { x: event.clientX, y: event.clientY, left: box.scrollLeft, top: box.scrollTop }
  }
  const onMove = (event: PointerEvent) => {
    if (!start) return
    const moved = { x: event.clientX - start.x, y: event.clientY - start.y }
    if (!hasDragged && Math.hypot(moved.x, moved.y) < dragFromPx) return
    hasDragged = true
    box.scrollLeft = start.left - moved.x
    box.scrollTop = start.top - moved.y
  }
  const onUp = () => (start = null)
  const onClick = (event: MouseEvent) => {
    if (hasDragged) event.stopPropagation()
    hasDragged = false
  }
  box.addEventListener('pointerdown', onDown)
  window.addEventListener('pointermove', onMove)
  window.addEventListener('pointerup', onUp)
  box.addEventListener('click', onClick, { capture: true })
  return () => {
    box.removeEventListener('pointerdown', onDown)
    window.removeEventListener('pointermove', onMove)
    window.removeEventListener('pointerup', onUp)
    box.removeEventListener('click', onClick, { capture: true })
  }
}
