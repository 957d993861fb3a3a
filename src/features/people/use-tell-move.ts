import { type CrewMove, movesGiving } from '../../../shared/people/crew-moves.ts'
import { dayNear } from '../../../shared/people/leave-words.ts'
import type { Crew, PersonDetail } from '../../../shared/people/people-schemas.ts'
import { useSession } from '../../lib/session.ts'
import { crewName } from './crew-name.ts'
import { useMoveCrew } from './time-queries.ts'
import type { Say } from './use-undo-line.tsx'

/** Moves a person, says so and offers the way back to all that was planned from that day on. */
export function useTellMove(person: PersonDetail, crews: readonly Crew[], say: Say) {
  const { firm } = useSession()
  const move = useMoveCrew()
  const back = useMoveCrew()
  const { id, memberships } = person
  const undo = async (from: string) => {
    for (const was of movesGiving(memberships, from)) await back.mutateAsync({ id, ...was })
  }
  const tell = (to: CrewMove, onDone?: () => void) =>
    move.mutate(
      { id, ...to },
      {
        onSuccess: () => {
          onDone?.()
          const from = dayNear(to.from, firm.today)
          say(`Moved: ${crewName(crews, to.crewId)} from ${from}.`, () => undo(to.from))
        },
      },
    )
  return { move, tell }
}
