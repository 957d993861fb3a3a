import type { ReactNode } from 'react'
import { Button } from './button.tsx'

/** Nothing here yet: says so and what to do about it. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: string
  children?: ReactNode
  action?: ReactNode
}) {
  return (
    <div className="rounded-md border border-dashed border-ink-soft px-4 py-10 text-center">
      <p className="text-lg font-semibold">{title}</p>
      {children ? <div className="mx-auto mt-1 max-w-prose text-ink-soft">{children}</div> : null}
      {action ? <div className="mt-4 flex justify-center">{action}</div> : null}
    </div>
  )
}

/** Something could not be loaded or saved. */
export function ErrorState({ message, onRetry }: { message: string; onRetry?: () => void }) {
  return (
    <div role="alert" className="rounded-md border-2 border-stop bg-sheet px-4 py-4">
      <p className="font-semibold text-stop">{message}</p>
      {onRetry ? (
        <Button kind="plain" className="mt-3" onClick={onRetry}>
          Try again
        </Button>
      ) : null}
    </div>
  )
}

type NoteKind = 'caution' | 'stop' | 'plain' | 'done'

const noteClasses: Record<NoteKind, string> = {
  caution: 'border-ochre',
  stop: 'border-stop',
  plain: 'border-rule',
  done: 'border-leaf',
}

/** A remark that stands out by a thick left edge and its first word. */
export function Note({
  kind = 'plain',
  title,
  children,
}: {
  kind?: NoteKind
  title?: string
  children?: ReactNode
}) {
  return (
    <div className={`rounded-md border border-l-8 bg-sheet px-3 py-2 ${noteClasses[kind]}`}>
      {title ? <p className="font-semibold">{title}</p> : null}
      {children}
    </div>
  )
}
