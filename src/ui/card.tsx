import type { ComponentProps } from 'react'

export function Card({ className = '', ...rest }: ComponentProps<'section'>) {
  return <section {...rest} className={`rounded-md border border-rule bg-sheet p-4 ${className}`} />
}
