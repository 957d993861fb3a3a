import { X } from 'lucide-react'
import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'

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

/** Traps focus, closes on Esc, gives focus back to where it came from. */
export function Dialog({ open, onClose, title, children, place = 'middle' }: Props) {
  return (
    <Radix.Root open={open} onOpenChange={(next) => (next ? undefined : onClose())}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-30 bg-ink/40" />
        <Radix.Content
          aria-describedby={undefined}
          className={`fixed inset-0 z-40 overflow-y-auto border border-rule bg-sheet p-4 shadow-float sm:p-6 ${places[place]}`}
        >
          <div className="mb-4 flex items-start justify-between gap-4">
            <Radix.Title className="text-xl font-extrabold leading-tight [overflow-wrap:anywhere]">
              {title}
            </Radix.Title>
            <Radix.Close
              aria-label="Close"
              className="-mr-2 -mt-2 flex h-11 w-11 shrink-0 items-center justify-center rounded-md"
            >
              <X size={22} aria-hidden />
            </Radix.Close>
          </div>
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
