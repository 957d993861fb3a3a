import { type ReactNode, useId, useState } from 'react'
import { Button } from '../../ui/button.tsx'

type Props = {
  title: string
  /** The words of the button that opens the form; none without a form. */
  action?: string
  form?: (close: () => void) => ReactNode
  children: ReactNode
}

/** A part of a panel: what there is, and its form when it is asked for. */
export function PanelSection({ title, action, form, children }: Props) {
  const [isOpen, setIsOpen] = useState(false)
  const openerId = useId()
  const close = () => {
    setIsOpen(false)
    document.getElementById(openerId)?.focus()
  }
  return (
    <section className="mt-6 border-t border-rule pt-4">
      <div className="mb-2 flex items-center justify-between gap-3">
        <h3 className="text-lg font-extrabold">{title}</h3>
        {action ? (
          <Button
            id={openerId}
            kind="plain"
            aria-expanded={isOpen}
            onClick={() => setIsOpen(!isOpen)}
          >
            {isOpen ? 'Close' : action}
          </Button>
        ) : null}
      </div>
      {isOpen && form ? (
        <div className="mb-4 rounded-md border border-rule bg-paper p-3">{form(close)}</div>
      ) : null}
      {children}
    </section>
  )
}

/** Parts one under the other; the first without a line over it. */
export function PanelParts({ children }: { children: ReactNode }) {
  return <div className="*:first:mt-0 *:first:border-0 *:first:pt-0">{children}</div>
}
