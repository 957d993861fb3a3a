import { useSyncExternalStore } from 'react'

const query = '(max-width: 639px)'

function subscribe(listener: () => void): () => void {
  const list = window.matchMedia(query)
  list.addEventListener('change', listener)
  return () => list.removeEventListener('change', listener)
}

/** Whether the screen is a phone's, where the grid becomes a list. */
export function useNarrow(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia(query).matches)
}
