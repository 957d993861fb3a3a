import { createContext, useContext } from 'react'
import type { BookingStep } from './booking-steps.ts'

export type MakeOptions = {
  /** Called once it stands. */
  onDone?: () => void
  /** Told of a refusal that asks nothing, instead of a notice on the page. */
  onFailed?: (error: unknown) => void
  /** Offered beside the answers when the days are taken. */
  otherWay?: { label: string; step: BookingStep } | undefined
}

/** Every change of bookings on this page, with what was done before. */
export type BookingMoves = {
  make: (step: BookingStep, options?: MakeOptions) => void
  /** Something that stands already, so that it can be taken back. */
  record: (step: BookingStep) => void
  undo: (id?: string) => void
  redo: () => void
  /** What the next undo or redo is about; null when there is none. */
  undoWords: string | null
  redoWords: string | null
  isPending: boolean
}

export const BookingMovesContext = createContext<BookingMoves | null>(null)

export function useBookingMoves(): BookingMoves {
  const moves = useContext(BookingMovesContext)
  if (!moves) throw new Error('useBookingMoves stands outside the calendar')
  return moves
}
