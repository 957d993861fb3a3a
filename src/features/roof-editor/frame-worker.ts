import { frameOfForm } from '../../../shared/revisions/frame-of-form.ts'
import type { FrameAnswer, FrameQuestion } from './frame-messages.ts'

function answerOf({ id, form, firm }: FrameQuestion): FrameAnswer {
  try {
    return { id, frame: frameOfForm(form, firm) }
  } catch (error) {
    console.warn(error)
    return { id, frame: null }
  }
}

/** Reads and frames off the main thread, so that typing never waits. */
self.onmessage = (event: MessageEvent<FrameQuestion>) => {
  self.postMessage(answerOf(event.data))
}
