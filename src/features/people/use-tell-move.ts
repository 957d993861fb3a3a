import { type CrewMove, movesGiving } from '../../../shared/people/crew-moves.ts'
import { dayNear } from '../../../shared/people/leave-words.ts'
import type { Crew, PersonDetail } from '../../../shared/people/people-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useToast } from '../../ui/toast.tsx'
import { crewName } from './crew-name.ts'
import { useMoveCrew } from './time-queries.ts'

/** Moves a person, says so and offers the way back to all that was planned from that day on. */
export function useTellMove(person: PersonDetail, crews: readonly Crew[]) {
  const { firm } = useSession()
  const toast = useToast()
  const move = useMoveCrew()
  const back = useMoveCrew()
  const { id, name, memberships } = person
  const undo = async (from: string) => {
    try {
      for (const was of movesGiving(memberships, from)) await back.mutateAsync({ id, ...was })
    } catch (error) {
      toast(failureText(error) ?? '', { kind: 'stop' })
    }
  }
  const tell = (to: CrewMove, onDone?: () => void) =>
    move.mutate(
      { id, ...to },
      {
        onSuccess: () => {
          const text = `${name}: ${crewName(crews, to.crewId)} from ${dayNear(to.from, firm.today)}.`
          toast(text, { undo: () => void undo(to.from) })
          onDone?.()
        },
      },
    )
  return { move, tell }
}
