import { startTransition, useEffect, useMemo, useState } from 'react'
import type { PlanDrawing, PlanDrawingOptions } from '../../shared/drawing/plan-drawing.ts'

/** Lays a plan out beside the screen, for one that changes as somebody types; null when it is out of date. */
export type LayOutPlan = (options: PlanDrawingOptions) => Promise<PlanDrawing | null>

type Ways = {
  /** At once, on this thread. */
  draw: () => PlanDrawing | null
  /** At once, without timbers: what stands until the first layout is there. */
  drawBare: () => PlanDrawing | null
  layOut: LayOutPlan | undefined
  options: PlanDrawingOptions
}

/** The plan laid out at once, or beside the screen where that is given: the last layout stands meanwhile. */
export function useLaidPlan({ draw, drawBare, layOut, options }: Ways): PlanDrawing | null {
  const [laid, setLaid] = useState<PlanDrawing | null>(null)
  useEffect(() => {
    if (!layOut) return
    let isLate = false
    void layOut(options).then((drawing) => {
      if (drawing && !isLate) startTransition(() => setLaid(drawing))
    })
    return () => {
      isLate = true
    }
  }, [layOut, options])
  const isBeside = layOut !== undefined
  const hasLaid = laid !== null
  const direct = useMemo(() => {
    if (!isBeside) return draw()
    return hasLaid ? null : drawBare()
  }, [isBeside, hasLaid, draw, drawBare])
  return isBeside ? (laid ?? direct) : direct
}
