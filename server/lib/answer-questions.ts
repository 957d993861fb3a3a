import { parentPort } from 'node:worker_threads'
import type { WorkerWord } from './worker-pool.ts'

/** The thread's side of a `WorkerPool`: each question is answered by `answerTo`, one after another. */
export function answerQuestions<Question, Answer>(answerTo: (question: Question) => Answer): void {
  const port = parentPort
  if (!port) throw new Error('This script runs in a thread only.')
  const say = (word: WorkerWord<Answer>) => port.postMessage(word)
  port.on('message', (question: Question) => {
    let word: WorkerWord<Answer>
    try {
      word = { answer: answerTo(question) }
    } catch (error) {
      word = { failure: error instanceof Error ? (error.stack ?? error.message) : String(error) }
    }
    say(word)
  })
  say({ ready: true })
}
