import type { ReactNode } from 'react'
import type { CalendarCrew } from '../../../shared/bookings/calendar-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { BookingMovesContext } from './booking-moves-context.ts'
import { nameOf, rebased } from './booking-steps.ts'
import { ClashAnswer } from './clash-answer.tsx'
import { StaleAnswer } from './stale-answer.tsx'
import { type BookingSteps, useBookingSteps } from './use-booking-steps.ts'
import { useUndoKeys } from './use-undo-keys.ts'

function Question({ steps, crews }: { steps: BookingSteps; crews: readonly CalendarCrew[] }) {
  const { question, isPending, giveUp } = steps
  if (!question) return null
  if (question.kind === 'clash') {
    const { otherWay } = question.options
    return (
      <ClashAnswer
        conflict={question.conflict}
        busy={isPending}
        onAnswer={steps.answerClash}
        onBack={giveUp}
      >
        {otherWay ? (
          <Button kind="plain" busy={isPending} onClick={steps.answerOtherWay}>
            {otherWay.label}
          </Button>
        ) : null}
      </ClashAnswer>
    )
  }
  const { current, step } = question
  const mine = rebased(step, current).parts.find((part) => part.id === current.id)?.after
  if (!mine) return null
  return (
    <StaleAnswer
      name={nameOf(current)}
      current={current}
      mine={mine}
      crews={crews}
      busy={isPending}
      onMine={steps.answerMine}
      onTheirs={giveUp}
    />
  )
}

/** Lets everything beneath change bookings, and asks what has to be asked. */
export function BookingMovesProvider(props: {
  crews: readonly CalendarCrew[]
  children: ReactNode
}) {
  const steps = useBookingSteps()
  useUndoKeys(steps)
  const { question } = steps
  return (
    <BookingMovesContext.Provider value={steps}>
      {props.children}
      <Dialog
        open={question !== null}
        onClose={steps.giveUp}
        title={question?.kind === 'stale' ? 'Changed by somebody else' : 'This day is not free'}
      >
        <Question steps={steps} crews={props.crews} />
      </Dialog>
    </BookingMovesContext.Provider>
  )
}
