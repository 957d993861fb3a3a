import { X } from 'lucide-react'
import { Popover } from 'radix-ui'
import { type ReactNode, useMemo, useRef } from 'react'
import { isTouched } from '../lib/pointer.ts'
import './pop-panel.css'

type Props = {
  /** What it is about and stands beside; null while shut. */
  anchor: Element | null
  title: string
  onClose: () => void
  children: ReactNode
}

/**
 * A few fields beside what they belong to; a sheet at the foot of a phone. The page stays in reach, Esc and
 * a click elsewhere close it, and focus goes back to where it came from.
 */
export function PopPanel({ anchor, title, onClose, children }: Props) {
  const titleRef = useRef<HTMLHeadingElement>(null)
  const contentRef = useRef<HTMLDivElement>(null)
  const bodyRef = useRef<HTMLDivElement>(null)
  const virtual = useMemo(
    () => ({ current: { getBoundingClientRect: () => rectOf(anchor) } }),
    [anchor],
  )
  return (
    <Popover.Root open={anchor !== null} onOpenChange={(open) => (open ? undefined : onClose())}>
      <Popover.Anchor virtualRef={virtual} />
      <Popover.Portal>
        <Popover.Content
          ref={contentRef}
          aria-label={title}
          side={isTall(anchor) ? 'left' : 'bottom'}
          sideOffset={10}
          collisionPadding={12}
          onOpenAutoFocus={(event) => {
            event.preventDefault()
            // Under a finger a field would bring the keyboard up over the drawing.
            const first = isTouched() ? null : firstField(bodyRef.current)
            ;(first ?? titleRef.current)?.focus()
            if (anchor) clearOf(anchor, contentRef.current)
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault()
            if (anchor instanceof SVGElement || anchor instanceof HTMLElement) anchor.focus()
          }}
          className="pop-panel z-30 max-h-[60dvh] w-full overflow-y-auto rounded-t-md border border-rule bg-sheet p-4 shadow-float outline-none sm:max-h-[min(60dvh,var(--radix-popover-content-available-height))] sm:w-80 sm:rounded-md"
        >
          <div className="mb-2 flex items-start justify-between gap-3">
            <h2 ref={titleRef} tabIndex={-1} className="text-lg font-extrabold outline-none">
              {title}
            </h2>
            <Popover.Close
              aria-label="Close"
              className="-mr-2 -mt-2 flex h-11 w-11 shrink-0 items-center justify-center rounded-md"
            >
              <X size={22} aria-hidden />
            </Popover.Close>
          </div>
          <div ref={bodyRef}>{children}</div>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  )
}

/** The choice that is taken, or the first field. */
function firstField(body: HTMLElement | null): HTMLElement | null {
  return body?.querySelector<HTMLElement>('input:checked') ?? body?.querySelector('input') ?? null
}

function isTall(anchor: Element | null): boolean {
  const { width, height } = rectOf(anchor)
  return height > width
}

const sheetGapPx = 24
const headRoomPx = 72

/** Scrolls what a sheet is about up from under it. */
function clearOf(anchor: Element, sheet: HTMLElement | null): void {
  if (!sheet || !window.matchMedia('(max-width: 639px)').matches) return
  const { top, bottom } = rectOf(anchor)
  const overPx = bottom + sheetGapPx - (window.innerHeight - sheet.offsetHeight)
  if (overPx > 0) window.scrollBy(0, Math.min(overPx, Math.max(top - headRoomPx, 0)))
}

function rectOf(anchor: Element | null): DOMRect {
  return anchor?.getBoundingClientRect() ?? new DOMRect()
}
