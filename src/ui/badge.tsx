import type { ReactNode } from 'react'

type Kind = 'plain' | 'clay' | 'chalk' | 'leaf' | 'ochre' | 'stop'

const kinds: Record<Kind, string> = {
  plain: 'border-ink-soft text-ink-soft',
  clay: 'border-clay text-clay',
  chalk: 'border-chalk text-chalk',
  leaf: 'border-leaf text-leaf',
  ochre: 'border-ochre text-ochre',
  stop: 'border-stop text-stop',
}

export function Badge({ kind = 'plain', children }: { kind?: Kind; children: ReactNode }) {
  return (
    <span
      className={`inline-flex items-center gap-1 rounded-sm border bg-sheet px-2 text-sm font-semibold ${kinds[kind]}`}
    >
      {children}
    </span>
  )
}
