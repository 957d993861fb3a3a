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
  const virtual = useMemo(
    () => ({ current: { getBoundingClientRect: () => rectOf(anchor) } }),
    [anchor],
  )
  return (
    <Popover.Root open={anchor !== null} onOpenChange={(open) => (open ? undefined : onClose())}>
      <Popover.Anchor virtualRef={virtual} />
      <Popover.Portal>
        <Popover.Content
          aria-label={title}
          side="bottom"
          sideOffset={10}
          collisionPadding={12}
          onOpenAutoFocus={(event) => {
            // Under a finger a field would bring the keyboard up over the drawing.
            if (!isTouched()) return
            event.preventDefault()
            titleRef.current?.focus()
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault()
            if (anchor instanceof SVGElement || anchor instanceof HTMLElement) anchor.focus()
          }}
          className="pop-panel z-30 max-h-[60dvh] w-full overflow-y-auto rounded-t-md border border-rule bg-sheet p-4 shadow-float outline-none sm:w-80 sm:rounded-md"
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
          {children}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  )
}

function rectOf(anchor: Element | null): DOMRect {
  return anchor?.getBoundingClientRect() ?? new DOMRect()
}
