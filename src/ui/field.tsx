import { type ReactElement, cloneElement, useId } from 'react'

type ControlProps = { id?: string; 'aria-invalid'?: boolean; 'aria-describedby'?: string }

type Props = {
  label: string
  hint?: string | undefined
  error?: string | undefined
  /** One control that takes `id` and the aria attributes. */
  children: ReactElement<ControlProps>
  className?: string
}

/** A labelled control with its hint and, beside it, what is wrong. */
export function Field({ label, hint, error, children, className = '' }: Props) {
  const id = useId()
  const hintId = `${id}-hint`
  const errorId = `${id}-error`
  const describedBy = [hint ? hintId : '', error ? errorId : ''].filter(Boolean).join(' ')
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block font-semibold">
        {label}
      </label>
      {cloneElement(children, {
        id,
        'aria-invalid': error ? true : undefined,
        'aria-describedby': describedBy || undefined,
      })}
      {hint ? (
        <p id={hintId} className="mt-1 text-sm text-ink-soft">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={errorId} role="alert" className="mt-1 text-sm font-semibold text-stop">
          {error}
        </p>
      ) : null}
    </div>
  )
}
