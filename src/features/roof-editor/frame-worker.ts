import { planDrawing } from '../../../shared/drawing/plan-drawing.ts'
import { sentPlan } from '../../../shared/drawing/sent-plan.ts'
import { type FormFrame, frameOfForm } from '../../../shared/revisions/frame-of-form.ts'
import type { FrameAnswer, FrameQuestion } from './frame-messages.ts'

/** The frame made last, for its plan. */
let last: { id: number; frame: FormFrame } | null = null

function answerOf(question: FrameQuestion): FrameAnswer {
  if (question.kind === 'plan') return planAnswer(question)
  const { id, form, firm } = question
  try {
    const frame = frameOfForm(form, firm)
    last = { id, frame }
    return { kind: 'frame', id, frame }
  } catch (error) {
    console.warn(error)
    return { kind: 'frame', id, frame: null }
  }
}

function planAnswer(question: FrameQuestion & { kind: 'plan' }): FrameAnswer {
  const { id, frameId, options } = question
  const roof = last?.frame.reading.roof
  if (!last || last.id !== frameId || !roof) return { kind: 'plan', id, plan: null }
  const drawing = planDrawing(roof, last.frame.spec, options)
  return { kind: 'plan', id, plan: drawing && sentPlan(drawing) }
}

/** Reads, frames and lays out off the main thread, so that typing never waits. */
self.onmessage = (event: MessageEvent<FrameQuestion>) => {
  self.postMessage(answerOf(event.data))
}
