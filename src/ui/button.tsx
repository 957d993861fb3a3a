import type { ButtonHTMLAttributes, MouseEvent } from 'react'

type Kind = 'primary' | 'plain' | 'quiet' | 'danger'
type Size = 'desk' | 'site'

const kinds: Record<Kind, string> = {
  primary: 'bg-clay text-on-fill border-clay',
  plain: 'bg-sheet text-ink border-ink-soft',
  quiet: 'bg-transparent text-chalk border-transparent underline-offset-4 hover:underline',
  danger: 'bg-sheet text-stop border-stop',
}

const sizes: Record<Size, string> = {
  desk: 'min-h-11 px-4',
  site: 'min-h-14 px-5 text-lg',
}

/** Classes of a button, for links that look like one. */
export function buttonClass(kind: Kind = 'primary', size: Size = 'desk'): string {
  return `inline-flex items-center justify-center gap-2 rounded-md border font-semibold disabled:opacity-50 ${kinds[kind]} ${sizes[size]}`
}

type Props = ButtonHTMLAttributes<HTMLButtonElement> & { kind?: Kind; size?: Size; busy?: boolean }

/** One that starts a call (`busy` given) takes a double click as one. */
export function Button({
  kind = 'primary',
  size = 'desk',
  busy,
  className = '',
  disabled,
  children,
  onClick,
  ...rest
}: Props) {
  const press = (event: MouseEvent<HTMLButtonElement>) => {
    if (busy !== undefined && event.detail > 1) event.preventDefault()
    else onClick?.(event)
  }
  return (
    <button
      type="button"
      {...rest}
      onClick={press}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      className={`${buttonClass(kind, size)} ${className}`}
    >
      {children}
    </button>
  )
}
