import { useEffect, useRef, useState, type RefObject } from 'react'

/** The width a drawing has been given; before it is known, the width a page would give it. */
export function useWidth<T extends HTMLElement>(fallbackPx: number): [RefObject<T | null>, number] {
  const ref = useRef<T>(null)
  const [widthPx, setWidthPx] = useState(fallbackPx)
  useEffect(() => {
    const box = ref.current
    if (!box || typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver(([entry]) => {
      const measured = Math.round(entry?.contentRect.width ?? 0)
      if (measured > 0) setWidthPx(measured)
    })
    observer.observe(box)
    return () => observer.disconnect()
  }, [])
  return [ref, widthPx]
}
