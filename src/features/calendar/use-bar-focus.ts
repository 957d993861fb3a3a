import { type KeyboardEvent, useEffect, useRef } from 'react'

const bars = (grid: HTMLElement | null): HTMLElement[] => [
  ...(grid?.querySelectorAll<HTMLElement>('[data-bar]') ?? []),
]

const columnsOf = (bar: HTMLElement): [number, number] => [
  Number(bar.dataset['column']),
  Number(bar.dataset['endColumn']),
]

/** How many columns lie between two bars; 0 when they stand over each other. */
function apart(a: HTMLElement, b: HTMLElement): number {
  const [[a1, a2], [b1, b2]] = [columnsOf(a), columnsOf(b)]
  return Math.max(0, b1 - a2, a1 - b2)
}

const rowOf = (bar: HTMLElement): Element | null => bar.closest('[data-crew]')

function beside(grid: HTMLElement, from: HTMLElement, step: -1 | 1): HTMLElement | undefined {
  const row = bars(grid).filter((bar) => rowOf(bar) === rowOf(from))
  row.sort((a, b) => columnsOf(a)[0] - columnsOf(b)[0])
  return row[row.indexOf(from) + step]
}

/** The nearest bar of the next crew that has one. */
function acrossCrews(grid: HTMLElement, from: HTMLElement, step: -1 | 1): HTMLElement | undefined {
  const rows = [...grid.querySelectorAll('[data-crew]')]
  const at = rows.findIndex((row) => row === rowOf(from))
  for (let i = at + step; i >= 0 && i < rows.length; i += step) {
    const there = bars(grid).filter((bar) => rowOf(bar) === rows[i])
    const nearest = there.sort((a, b) => apart(from, a) - apart(from, b))[0]
    if (nearest) return nearest
  }
  return undefined
}

const ways: Record<string, (grid: HTMLElement, from: HTMLElement) => HTMLElement | undefined> = {
  ArrowLeft: (grid, from) => beside(grid, from, -1),
  ArrowRight: (grid, from) => beside(grid, from, 1),
  ArrowUp: (grid, from) => acrossCrews(grid, from, -1),
  ArrowDown: (grid, from) => acrossCrews(grid, from, 1),
  Home: (grid) => bars(grid)[0],
  End: (grid) => bars(grid).at(-1),
}

/** Arrows from booking to booking; a booking that moved keeps the focus it had. */
export function useBarFocus(grid: HTMLElement | null) {
  const wanted = useRef<string | null>(null)
  // After each drawing: a booking that moved is drawn anew somewhere else, and its focus went to nothing.
  useEffect(() => {
    const id = wanted.current
    const isLost = document.activeElement === null || document.activeElement === document.body
    if (id === null || !isLost) return
    grid?.querySelector<HTMLElement>(`[data-booking="${id}"]`)?.focus()
  })
  useEffect(() => {
    const forget = () => {
      wanted.current = null
    }
    document.addEventListener('pointerdown', forget)
    return () => document.removeEventListener('pointerdown', forget)
  }, [])
  return {
    keep: (bookingId: string) => {
      wanted.current = bookingId
    },
    /** Whether the key was one that goes to another booking. */
    step: (event: KeyboardEvent<HTMLElement>): boolean => {
      const way = ways[event.key]
      if (!way || !grid || event.shiftKey || event.ctrlKey || event.metaKey) return false
      event.preventDefault()
      way(grid, event.currentTarget)?.focus()
      return true
    },
  }
}
