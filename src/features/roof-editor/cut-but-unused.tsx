import type { Issued } from '../../../shared/revisions/revision-schemas.ts'
import { Note } from '../../ui/states.tsx'

/** After an issue: what has been cut already and the new roof has no place for. */
export function CutButUnused({ issued }: { issued: Issued | null }) {
  if (!issued || issued.cutButUnused.length === 0) return null
  return (
    <div role="status" className="mb-4">
      <Note
        kind="caution"
        title={`Already cut, and not used in revision ${issued.revision.letter}`}
      >
        <ul>
          {issued.cutButUnused.map(({ letter, marks }) => (
            <li key={letter}>
              Cut to {letter}: {marks.join(', ')}
            </li>
          ))}
        </ul>
        <p>Tell the crew to put them aside; the pieces of the new roof are planned to be cut.</p>
      </Note>
    </div>
  )
}
