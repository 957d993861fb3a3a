import { AppError } from '../http/app-error.ts'
import {
  createWorkerPool,
  type WorkerPool,
  WorkersBusyError,
  WorkerTooSlowError,
} from '../lib/worker-pool.ts'
import type { PreparedRevision, RevisionQuestion } from './prepare-revision.ts'

/** Reads and frames roofs beside the thread that answers requests. */
export type Framer = {
  /** @throws AppError when the plan takes too long, or too many are waiting. */
  prepare(question: RevisionQuestion): Promise<PreparedRevision>
  warm(): void
  close(): Promise<void>
}

const defaults = {
  script: new URL('./frame-thread.ts', import.meta.url),
  // One slow plan does not hold up the next.
  threads: 2,
  limitMs: 20_000,
  mostWaiting: 20,
}

export function createFramer(changes: Partial<typeof defaults> = {}): Framer {
  const options = { ...defaults, ...changes }
  const pool: WorkerPool<RevisionQuestion, PreparedRevision> = createWorkerPool(options)
  return {
    prepare: (question) =>
      pool.ask(question).catch((error: unknown) => {
        throw inWords(error, options.limitMs)
      }),
    warm: () => pool.warm(),
    close: () => pool.close(),
  }
}

const remedy =
  'It was given up and nothing was issued. Leave out corners it can do without, or enter it as two roofs.'

const isOutOfMemory = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY'

function inWords(error: unknown, limitMs: number): unknown {
  if (error instanceof WorkerTooSlowError) {
    const words = `This plan takes too long to frame, over ${Math.ceil(limitMs / 1000)} s. ${remedy}`
    return new AppError('invalid_input', words, { cause: error })
  }
  if (isOutOfMemory(error)) {
    const words = `This plan takes too much memory to frame. ${remedy}`
    return new AppError('invalid_input', words, { cause: error })
  }
  if (error instanceof WorkersBusyError) {
    const words = 'Too many roofs are being framed at once. Wait a minute and issue this one again.'
    return new AppError('too_many', words, { cause: error })
  }
  return error
}
