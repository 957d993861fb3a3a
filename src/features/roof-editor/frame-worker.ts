import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { RoofRefusedError } from '../../../shared/roof/roof-problems.ts'
import type { FrameAnswer, FrameQuestion } from './frame-messages.ts'

function answerOf({ id, roof, settings }: FrameQuestion): FrameAnswer {
  try {
    return { id, spec: frameRoof(roof, settings), message: null }
  } catch (error) {
    const refused = error instanceof RoofRefusedError
    const first = refused ? error.problems[0]?.message : undefined
    return { id, spec: null, message: first ?? 'This roof could not be framed.' }
  }
}

/** Frames off the main thread, so that typing never waits. */
self.onmessage = (event: MessageEvent<FrameQuestion>) => {
  self.postMessage(answerOf(event.data))
}
