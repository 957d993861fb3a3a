import { useEffect, useEffectEvent } from 'react'

/** Ctrl or Cmd with Z takes back, with Shift (or Ctrl Y) does again; not while typing or in a dialog. */
export function useUndoKeys(moves: { undo: () => void; redo: () => void }): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    if (!(event.ctrlKey || event.metaKey) || event.altKey) return
    const key = event.key.toLowerCase()
    if (key !== 'z' && key !== 'y') return
    const { target } = event
    if (target instanceof HTMLElement && target.matches('input, textarea, select')) return
    if (document.querySelector('[role="dialog"]')) return
    event.preventDefault()
    if (key === 'y' || event.shiftKey) moves.redo()
    else moves.undo()
  })
  useEffect(() => {
    const listen = (event: KeyboardEvent) => press(event)
    document.addEventListener('keydown', listen)
    return () => document.removeEventListener('keydown', listen)
  }, [])
}
