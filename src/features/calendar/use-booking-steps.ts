import { useRef, useState, useSyncExternalStore } from 'react'
import { staleBookingSchema } from '../../../shared/bookings/booking-changes.ts'
import type { BookingConflict } from '../../../shared/bookings/booking-schemas.ts'
import type { Booking } from '../../../shared/bookings/calendar-schemas.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { useToast } from '../../ui/toast.tsx'
import { createBookingHistory } from './booking-history.ts'
import type { BookingMoves, MakeOptions } from './booking-moves-context.ts'
import { type BookingStep, isIdle, rebased } from './booking-steps.ts'
import { conflictOf } from './calendar-queries.ts'
import type { OnPurpose } from './clash-answer.tsx'
import { bodyOf, type Direction, settledStep } from './step-bodies.ts'
import { useSendStep } from './use-send-step.ts'

/** A question that came back instead of an answer; what was asked for is kept. */
export type MoveQuestion = { step: BookingStep; options: MakeOptions } & (
  { kind: 'clash'; conflict: BookingConflict } | { kind: 'stale'; current: Booking }
)

function staleOf(error: unknown): Booking | null {
  if (!(error instanceof ApiFailure)) return null
  const parsed = staleBookingSchema.safeParse(error.error.detail)
  return parsed.success ? parsed.data.current : null
}

const wordsOf = (error: unknown): string =>
  error instanceof Error ? error.message : 'That did not go through. Try again.'

function movedOnWords(step: BookingStep, current: Booking, direction: Direction): string {
  const verb = direction === 'back' ? 'taken back' : 'done again'
  return `Somebody else changed ${current.job.number} ${current.job.title} since, and it stays as it is now. Not ${verb}: ${step.words}.`
}

function questionOf(error: unknown, step: BookingStep, options: MakeOptions): MoveQuestion | null {
  const conflict = conflictOf(error)
  const current = staleOf(error)
  if (conflict) return { kind: 'clash', step, options, conflict }
  return current ? { kind: 'stale', step, options, current } : null
}

/** One thing after another; what waits is dropped when one before it fails. */
function useTurns() {
  const last = useRef(Promise.resolve())
  const round = useRef(0)
  return (work: () => Promise<boolean>): void => {
    const asked = round.current
    last.current = last.current.then(async () => {
      if (asked === round.current && !(await work())) round.current++
    })
  }
}

/** Sends steps and keeps them to be taken back and done again. */
function useSteps() {
  const toast = useToast()
  const { send, isPending } = useSendStep()
  const [history] = useState(createBookingHistory)
  const [question, setQuestion] = useState<MoveQuestion | null>(null)
  const inTurn = useTurns()

  async function run(step: BookingStep, direction: Direction, said: OnPurpose | null) {
    const body = bodyOf(step, direction, { versionOf: history.versionOf, said })
    const bookings = await send(step, direction, body)
    for (const { id, version } of bookings) history.sawVersion(id, version)
    return settledStep(step, bookings, direction)
  }

  /** Back or on again: a change like any other, refused when a booking has moved on since. */
  function go(direction: Direction, id?: string): void {
    inTurn(async () => {
      const { done, undone } = history.read()
      const from = direction === 'back' ? done : undone
      const step = id === undefined ? from[from.length - 1] : from.find((one) => one.id === id)
      if (!step) return true
      try {
        const standing = await run(step, direction, null)
        if (direction === 'back') history.wentBack(standing)
        else history.wentOn(standing)
        toast(direction === 'back' ? `Taken back: ${step.words}.` : `Done again: ${step.words}.`)
        return true
      } catch (error) {
        const current = staleOf(error)
        if (current) history.forget(step.id)
        toast(current ? movedOnWords(step, current, direction) : wordsOf(error), { kind: 'stop' })
        return false
      }
    })
  }

  function make(step: BookingStep, options: MakeOptions = {}, said: OnPurpose = {}): void {
    inTurn(async () => {
      if (isIdle(step)) return true
      try {
        history.did(await run(step, 'on', said))
        setQuestion(null)
        toast(`${step.words}.`, { undo: () => go('back', step.id) })
        options.onDone?.()
        return true
      } catch (error) {
        const asked = questionOf(error, step, options)
        setQuestion(asked)
        if (!asked && options.onFailed) options.onFailed(error)
        else if (!asked) toast(wordsOf(error), { kind: 'stop' })
        return false
      }
    })
  }

  return { history, question, setQuestion, go, make, isPending }
}

export type BookingSteps = BookingMoves & {
  question: MoveQuestion | null
  answerClash: (said: OnPurpose) => void
  answerOtherWay: () => void
  answerMine: () => void
  giveUp: () => void
}

/** Every change of bookings on a page, what was done before, and the questions that come back. */
export function useBookingSteps(): BookingSteps {
  const { history, question, setQuestion, go, make, isPending } = useSteps()
  const { done, undone } = useSyncExternalStore(history.subscribe, history.read)
  const other = question?.options.otherWay
  return {
    make: (step, options) => make(step, options),
    record: (step) => history.did(step),
    undo: (id) => go('back', id),
    redo: () => go('on'),
    undoWords: done[done.length - 1]?.words ?? null,
    redoWords: undone[undone.length - 1]?.words ?? null,
    isPending,
    question,
    answerClash: (said) => (question ? make(question.step, question.options, said) : undefined),
    answerOtherWay: () =>
      question && other
        ? make(other.step, { ...question.options, otherWay: undefined })
        : undefined,
    answerMine: () =>
      question?.kind === 'stale'
        ? make(rebased(question.step, question.current), question.options)
        : undefined,
    giveUp: () => setQuestion(null),
  }
}
