import { useCallback, useEffect, useLayoutEffect, useRef, useState, type RefObject } from 'react'
import type { PlanView } from '../../shared/drawing/plan-view.ts'
import type { Point2 } from '../../shared/roof/roof-types.ts'
import { openPlanWindow, type PlanShown, type PlanWindow } from './plan-window.ts'

const restMs = 140

/** A size follows another once that has come to rest: words are set anew when the fingers are still. */
export function useRested(value: number): number {
  const [rested, setRested] = useState(value)
  useEffect(() => {
    if (value === rested) return
    const timer = setTimeout(() => setRested(value), restMs)
    return () => clearTimeout(timer)
  }, [value, rested])
  return rested
}

type ZoomState = { zoom: number; setZoom: (zoom: number) => void; maxZoom: number }

/** Opens the window over a plan; what it gives draws larger or smaller, about a point if told. */
export function usePlanWindow(
  boxRef: RefObject<HTMLDivElement | null>,
  view: PlanView | null,
  { zoom, setZoom, maxZoom }: ZoomState,
): (zoom: number, middle?: Point2) => void {
  const shown = useRef<PlanShown>({ view, zoom, maxZoom })
  const opened = useRef<PlanWindow | null>(null)
  useLayoutEffect(() => {
    shown.current = { view, zoom, maxZoom }
    opened.current?.settle()
  }, [view, zoom, maxZoom])
  useEffect(() => {
    const box = boxRef.current
    if (!box) return
    const planWindow = openPlanWindow(box, () => shown.current, setZoom)
    opened.current = planWindow
    return () => {
      planWindow.close()
      opened.current = null
    }
  }, [boxRef, setZoom])
  return useCallback((to, middle) => opened.current?.zoomTo(to, middle), [])
}
