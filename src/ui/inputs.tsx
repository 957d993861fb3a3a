import type { ComponentProps } from 'react'

const boxClass =
  'w-full min-h-11 rounded-md border border-ink-soft bg-sheet px-3 text-ink aria-invalid:border-2 aria-invalid:border-stop disabled:opacity-60'

/** React 19 passes `ref` as a prop, so these work with form libraries as they are. */
export function TextInput({ className = '', ...rest }: ComponentProps<'input'>) {
  return <input {...rest} className={`${boxClass} ${className}`} />
}

export function TextArea({ className = '', ...rest }: ComponentProps<'textarea'>) {
  return <textarea rows={3} {...rest} className={`${boxClass} py-2 ${className}`} />
}

export function Select({ className = '', ...rest }: ComponentProps<'select'>) {
  return <select {...rest} className={`${boxClass} ${className}`} />
}

type CheckboxProps = ComponentProps<'input'> & { label: string }

export function Checkbox({ label, className = '', ...rest }: CheckboxProps) {
  return (
    <label className={`flex min-h-11 items-center gap-3 ${className}`}>
      <input {...rest} type="checkbox" className="h-5 w-5 accent-clay" />
      {label}
    </label>
  )
}
