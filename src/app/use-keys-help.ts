import { useEffect, useState } from 'react'
import { isPlainKey } from '../lib/plain-key.ts'

/** `?` opens the list of keys from anywhere on the page. */
export function useKeysHelp() {
  const [isOpen, setIsOpen] = useState(false)
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!isPlainKey(event, '?')) return
      event.preventDefault()
      setIsOpen(true)
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
  return { isOpen, open: () => setIsOpen(true), close: () => setIsOpen(false) }
}
