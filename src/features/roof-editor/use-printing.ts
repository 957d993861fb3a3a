import { useSyncExternalStore } from 'react'
import { flushSync } from 'react-dom'

function subscribe(listener: () => void): () => void {
  const media = window.matchMedia('print')
  // What only paper needs must stand on the page before the browser lays the paper out.
  const onChange = () => flushSync(listener)
  media.addEventListener('change', onChange)
  window.addEventListener('beforeprint', onChange)
  window.addEventListener('afterprint', onChange)
  return () => {
    media.removeEventListener('change', onChange)
    window.removeEventListener('beforeprint', onChange)
    window.removeEventListener('afterprint', onChange)
  }
}

/** Whether the page is being laid out for paper. */
export function usePrinting(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia('print').matches)
}
