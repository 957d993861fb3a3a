import type { PlanDrawing } from './plan-drawing.ts'
import type { PlanView } from './plan-view.ts'

/** A plan as plain data, so that a thread beside the screen can lay it out and send it. */
export type SentPlan = Omit<PlanDrawing, 'view'> & {
  view: Omit<PlanView, 'place'> & { origin: { x: number; y: number } }
}

export function sentPlan(drawing: PlanDrawing): SentPlan {
  const { place, ...view } = drawing.view
  return { ...drawing, view: { ...view, origin: place({ x: 0, y: 0 }) } }
}

export function planOfSent(sent: SentPlan): PlanDrawing {
  const { origin, ...view } = sent.view
  const { pxPerMm } = view
  return {
    ...sent,
    view: {
      ...view,
      place: ({ x, y }) => ({ x: origin.x + x * pxPerMm, y: origin.y - y * pxPerMm }),
    },
  }
}
