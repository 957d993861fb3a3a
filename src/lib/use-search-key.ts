import { type RefObject, useEffect, useRef } from 'react'
import { isPlainKey } from './plain-key.ts'

/** `/` goes to the search from anywhere on the page. */
export function useSearchKey(): RefObject<HTMLInputElement | null> {
  const input = useRef<HTMLInputElement>(null)
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!isPlainKey(event, '/')) return
      event.preventDefault()
      input.current?.focus()
      input.current?.select()
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
  return input
}
