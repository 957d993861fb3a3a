import { type ReactNode, useEffect } from 'react'

type Props = { title: string; lead?: ReactNode; actions?: ReactNode }

/** The one h1 of a page, which also names the browser tab. */
export function PageHeader({ title, lead, actions }: Props) {
  useEffect(() => {
    document.title = `${title} · Ridgehand`
  }, [title])
  return (
    <header className="mb-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <h1 className="text-2xl font-extrabold leading-tight [overflow-wrap:anywhere]">{title}</h1>
        {lead ? <div className="mt-1 text-ink-soft">{lead}</div> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-2 print:hidden">{actions}</div> : null}
    </header>
  )
}
