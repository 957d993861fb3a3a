import { useEffect, useState } from 'react'
import { flushSync } from 'react-dom'

/** Whether the page is being laid out for paper. */
export function usePrinting(): boolean {
  const [isPrinting, setIsPrinting] = useState(() => window.matchMedia('print').matches)
  useEffect(() => {
    const media = window.matchMedia('print')
    // What only paper needs must stand on the page before the browser lays the paper out.
    const before = () => flushSync(() => setIsPrinting(true))
    const after = () => setIsPrinting(media.matches)
    const onMedia = () => flushSync(() => setIsPrinting(media.matches))
    window.addEventListener('beforeprint', before)
    window.addEventListener('afterprint', after)
    media.addEventListener('change', onMedia)
    return () => {
      window.removeEventListener('beforeprint', before)
      window.removeEventListener('afterprint', after)
      media.removeEventListener('change', onMedia)
    }
  }, [])
  return isPrinting
}
