import { X } from 'lucide-react'
import { Dialog as Radix } from 'radix-ui'
import { type ReactNode, useRef } from 'react'
import { isTouched } from '../lib/pointer.ts'

type Props = {
  open: boolean
  onClose: () => void
  title: string
  children: ReactNode
  /** 'panel' slides in beside the page at the desk; 'middle' floats. Both fill a phone. */
  place?: 'middle' | 'panel'
}

const places = {
  middle:
    'sm:inset-auto sm:left-1/2 sm:top-1/2 sm:w-[min(36rem,92vw)] sm:max-h-[88vh] sm:-translate-x-1/2 sm:-translate-y-1/2 sm:rounded-md',
  panel: 'sm:inset-y-0 sm:left-auto sm:right-0 sm:w-[min(34rem,92vw)]',
}

const controls = 'a[href], button:not(:disabled), input:not(:disabled), select, textarea'

/** A form's first field; otherwise the title, so that reading begins at the top. Under a finger the title too: a field would bring the keyboard up over the form. */
function firstPlace(title: HTMLElement | null, body: HTMLElement | null): HTMLElement | null {
  const first = body?.querySelector<HTMLElement>(controls)
  const isField = first?.matches('input, select, textarea') ?? false
  return isField && !isTouched() ? (first ?? null) : title
}

/** Traps focus, closes on Esc, gives focus back to where it came from; a click beside it does not throw typing away. */
export function Dialog({ open, onClose, title, children, place = 'middle' }: Props) {
  const titleRef = useRef<HTMLHeadingElement>(null)
  const bodyRef = useRef<HTMLDivElement>(null)
  const wasTyped = useRef(false)
  return (
    <Radix.Root open={open} onOpenChange={(next) => (next ? undefined : onClose())}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-30 bg-scrim" />
        <Radix.Content
          aria-describedby={undefined}
          onOpenAutoFocus={(event) => {
            event.preventDefault()
            wasTyped.current = false
            firstPlace(titleRef.current, bodyRef.current)?.focus()
          }}
          onInteractOutside={(event) => {
            if (wasTyped.current) event.preventDefault()
          }}
          className={`fixed inset-0 z-40 overflow-y-auto border border-rule bg-sheet p-4 shadow-float sm:p-6 ${places[place]}`}
        >
          <div className="mb-4 flex items-start justify-between gap-4">
            <Radix.Title
              ref={titleRef}
              tabIndex={-1}
              className="text-xl font-extrabold leading-tight outline-none [overflow-wrap:anywhere]"
            >
              {title}
            </Radix.Title>
            <Radix.Close
              aria-label="Close"
              className="-mr-2 -mt-2 flex h-11 w-11 shrink-0 items-center justify-center rounded-md"
            >
              <X size={22} aria-hidden />
            </Radix.Close>
          </div>
          <div
            ref={bodyRef}
            onChange={() => {
              wasTyped.current = true
            }}
          >
            {children}
          </div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
