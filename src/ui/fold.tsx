import { ChevronDown } from 'lucide-react'
import type { ReactNode } from 'react'

/** Something that can be put away; `isOpen` is how it starts. */
export function Fold({
  title,
  isOpen = false,
  children,
}: {
  title: string
  isOpen?: boolean
  children: ReactNode
}) {
  return (
    <details open={isOpen} className="group">
      <summary className="flex min-h-14 list-none items-center gap-2 font-semibold text-chalk print:hidden [&::-webkit-details-marker]:hidden">
        <ChevronDown size={22} aria-hidden className="shrink-0 group-open:rotate-180" />
        {title}
      </summary>
      {children}
    </details>
  )
}
