import { OctagonAlert, TriangleAlert } from 'lucide-react'
import type { ReactNode } from 'react'

export type FlagWeight = 'clash' | 'caution'

/** Something amiss, its weight by icon and colour. */
export function FlagLine({ weight, children }: { weight: FlagWeight; children: ReactNode }) {
  const Icon = weight === 'clash' ? OctagonAlert : TriangleAlert
  return (
    <span
      className={`flex items-start gap-1 font-semibold ${weight === 'clash' ? 'text-stop' : 'text-ochre'}`}
    >
      <Icon aria-hidden className="mt-[0.2em] h-[1em] w-[1em] shrink-0" />
      <span className="min-w-0 [overflow-wrap:anywhere]">{children}</span>
    </span>
  )
}

type ItemProps = { weight: FlagWeight; when: string; text: string; wayOut?: string | undefined }

/** The same as a whole sentence, with the days it is of and a way out. */
export function FlagItem({ weight, when, text, wayOut }: ItemProps) {
  return (
    <li className="py-2">
      <p className="text-sm text-ink-soft">
        {weight === 'clash' ? 'Clash' : 'Caution'}, {when}
      </p>
      <FlagLine weight={weight}>{text}</FlagLine>
      {wayOut ? <p>{wayOut}</p> : null}
    </li>
  )
}
