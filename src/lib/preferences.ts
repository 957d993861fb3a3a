import { useSyncExternalStore } from 'react'

/** Looks of this device only: kept in its own storage, never on the server. */
type Name = 'theme' | 'sunlight'

const listeners = new Set<() => void>()

function read(name: Name): string {
  try {
    return window.localStorage.getItem(`ridgehand.${name}`) ?? ''
  } catch {
    return ''
  }
}

function apply(name: Name, value: string): void {
  if (value) document.documentElement.setAttribute(`data-${name}`, value)
  else document.documentElement.removeAttribute(`data-${name}`)
}

export function applyPreferences(): void {
  apply('theme', read('theme'))
  apply('sunlight', read('sunlight'))
}

export function setPreference(name: Name, value: string): void {
  try {
    window.localStorage.setItem(`ridgehand.${name}`, value)
  } catch {
    // Storage may be shut off; the look then lasts until reload.
  }
  apply(name, value)
  for (const listener of listeners) listener()
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener)
  return () => listeners.delete(listener)
}

export function usePreference(name: Name): string {
  return useSyncExternalStore(subscribe, () => read(name))
}
