import { type RefObject, useEffect, useRef } from 'react'

/** Puts the cursor into a refused form's first wrong field. */
export function useFaultFocus(error: unknown): RefObject<HTMLFormElement | null> {
  const form = useRef<HTMLFormElement>(null)
  useEffect(() => {
    if (error) form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus()
  }, [error])
  return form
}
