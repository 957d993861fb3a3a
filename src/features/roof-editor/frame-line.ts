import type { PlanDrawing, PlanDrawingOptions } from '../../../shared/drawing/plan-drawing.ts'
import { planOfSent } from '../../../shared/drawing/sent-plan.ts'
import type { FormFrame } from '../../../shared/revisions/frame-of-form.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import type { FormFirm } from '../../../shared/revisions/roof-of-form.ts'
import type { FrameAnswer, FrameQuestion } from './frame-messages.ts'

export type Answered = {
  form: RoofForm
  frame: FormFrame | null
  /** Lays out the plan of this frame; null once another has been framed. */
  layOut: (options: PlanDrawingOptions) => Promise<PlanDrawing | null>
}

export type FrameLine = { ask: (form: RoofForm, firm: FormFirm) => void; close: () => void }

/** The line to the thread that frames. Of roofs that queue up while it works, only the newest is asked. */
export function openFrameLine(onAnswer: (answered: Answered) => void): FrameLine {
  const worker = new Worker(new URL('./frame-worker.ts', import.meta.url), { type: 'module' })
  const plans = new Map<number, (drawing: PlanDrawing | null) => void>()
  let asked: { id: number; form: RoofForm } | null = null
  let next: { form: RoofForm; firm: FormFirm } | null = null
  let count = 0
  const post = (question: FrameQuestion) => worker.postMessage(question)
  const send = () => {
    if (asked !== null || next === null) return
    asked = { id: ++count, form: next.form }
    post({ kind: 'frame', id: asked.id, ...next })
    next = null
  }
  const layOut = (frameId: number, options: PlanDrawingOptions) =>
    new Promise<PlanDrawing | null>((resolve) => {
      const id = ++count
      plans.set(id, resolve)
      post({ kind: 'plan', id, frameId, options })
    })
  worker.onmessage = ({ data }: MessageEvent<FrameAnswer>) => {
    if (data.kind === 'plan') {
      plans.get(data.id)?.(data.plan && planOfSent(data.plan))
      plans.delete(data.id)
      return
    }
    const { id, frame } = data
    const form = asked?.id === id ? asked.form : null
    asked = null
    if (form) onAnswer({ form, frame, layOut: (options) => layOut(id, options) })
    send()
  }
  return {
    ask(form, firm) {
      next = { form, firm }
      send()
    },
    close: () => worker.terminate(),
  }
}
