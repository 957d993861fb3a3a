import { Worker } from 'node:worker_threads'

/** What a thread's script posts: once when it is ready, then one for each question, in order. */
export type WorkerWord<Answer> = { ready: true } | { answer: Answer } | { failure: string }

/** The question was still being worked on when its time was up. */
export class WorkerTooSlowError extends Error {}
/** More questions are waiting than will be answered in any useful time. */
export class WorkersBusyError extends Error {}

export type WorkerPool<Question, Answer> = {
  ask(question: Question): Promise<Answer>
  /** Starts the first thread, so that the first question does not wait for its script to load. */
  warm(): void
  /** Ends all threads; what was asked and not answered is refused. */
  close(): Promise<void>
}

type Options = {
  /** TypeScript that runs in each thread; see `answerQuestions`. */
  script: URL
  threads: number
  /** From when a thread begins with a question to its answer. */
  limitMs: number
  mostWaiting: number
}

type Job<Question, Answer> = {
  question: Question
  resolve: (answer: Answer) => void
  reject: (error: Error) => void
}

type Thread<Question, Answer> = {
  isIdle(): boolean
  give(job: Job<Question, Answer>): void
  /** Ends it; whoever waits for its answer is told why. */
  end(error: Error): Promise<unknown>
}

/** For a script to load, on a slow machine; not counted against the question. */
const startLimitMs = 30_000
/** A plan that grows without end must not take the server's memory with it. */
const heapLimitMb = 512

const starter = new URL('./start-thread.mjs', import.meta.url)

type Told<Question, Answer> = {
  /** It has answered and can take the next. */
  idle(): void
  /** It broke down or ran out of time; `isBroken` when it never came as far as its first question. */
  ended(thread: Thread<Question, Answer>, error: Error, isBroken: boolean): void
}

function startThread<Question, Answer>(
  { script, limitMs }: Options,
  tell: Told<Question, Answer>,
): Thread<Question, Answer> {
  const worker = new Worker(starter, {
    workerData: { script: script.href },
    execArgv: [],
    resourceLimits: { maxOldGenerationSizeMb: heapLimitMb },
  })
  worker.unref()
  let job: Job<Question, Answer> | null = null
  let timer: NodeJS.Timeout | undefined
  let isReady = false
  let hasEnded = false

  const startTimer = (): void => {
    clearTimeout(timer)
    const allowedMs = isReady ? limitMs : startLimitMs
    const tooSlow = () => fail(new WorkerTooSlowError(`no answer within ${allowedMs} ms`))
    timer = setTimeout(tooSlow, allowedMs)
  }
  const takeJob = (): Job<Question, Answer> | null => {
    clearTimeout(timer)
    const taken = job
    job = null
    return taken
  }
  const end = (error: Error): Promise<unknown> => {
    hasEnded = true
    takeJob()?.reject(error)
    return worker.terminate()
  }
  const fail = (error: Error): void => {
    if (hasEnded) return
    const isBroken = !isReady && job === null
    void end(error)
    tell.ended(thread, error, isBroken)
  }
  const hear = (word: WorkerWord<Answer>): void => {
    if ('ready' in word) {
      isReady = true
      if (job) startTimer()
      return
    }
    const answered = takeJob()
    if ('answer' in word) answered?.resolve(word.answer)
    else answered?.reject(new Error(word.failure))
    tell.idle()
  }
  worker.on('message', hear)
  worker.on('messageerror', fail)
  worker.on('error', (thrown: unknown) => fail(asError(thrown)))
  worker.on('exit', (code) => fail(new Error(`the thread ended with code ${code}`)))
  const thread: Thread<Question, Answer> = {
    isIdle: () => job === null,
    give(given) {
      job = given
      startTimer()
      worker.postMessage(given.question)
    },
    end,
  }
  return thread
}

/**
 * Long-lived threads and a queue before them, for sums that would stop every other request. A thread
 * that breaks down or runs out of time is ended, its question refused, and another takes its place.
 */
export function createWorkerPool<Question, Answer>(options: Options): WorkerPool<Question, Answer> {
  const threads = new Set<Thread<Question, Answer>>()
  const waiting: Job<Question, Answer>[] = []
  let isClosed = false

  function start(): Thread<Question, Answer> {
    const thread = startThread<Question, Answer>(options, {
      idle: next,
      ended(gone, error, isBroken) {
        threads.delete(gone)
        // One that breaks down while it loads would do so again: whoever waits is told.
        if (isBroken) waiting.shift()?.reject(error)
        next()
      },
    })
    threads.add(thread)
    return thread
  }

  function next(): void {
    if (isClosed) return
    while (waiting.length > 0) {
      const idle = [...threads].find((thread) => thread.isIdle())
      if (!idle && threads.size >= options.threads) return
      const job = waiting.shift()
      if (job) (idle ?? start()).give(job)
    }
  }

  return {
    ask: (question) =>
      new Promise<Answer>((resolve, reject) => {
        if (isClosed) return reject(closing())
        if (waiting.length >= options.mostWaiting) {
          return reject(new WorkersBusyError('the queue is full'))
        }
        waiting.push({ question, resolve, reject })
        next()
      }),
    warm() {
      if (threads.size === 0 && !isClosed) start()
    },
    async close() {
      isClosed = true
      for (const job of waiting.splice(0)) job.reject(closing())
      await Promise.all([...threads].map((thread) => thread.end(closing())))
    },
  }
}

const closing = () => new Error('the server is closing')

const asError = (thrown: unknown): Error =>
  thrown instanceof Error ? thrown : new Error(String(thrown))
