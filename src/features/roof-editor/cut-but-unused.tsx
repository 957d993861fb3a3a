import type { Issued } from '../../../shared/revisions/revision-schemas.ts'
import { Note } from '../../ui/states.tsx'

/** 'C1 × 48, H1 × 3': pieces of a line share the mark before their own letters. */
function byLine(marks: readonly string[]): string {
  const counts = new Map<string, number>()
  for (const mark of marks) {
    const line = mark.replace(/[a-z]+$/, '')
    counts.set(line, (counts.get(line) ?? 0) + 1)
  }
  return [...counts].map(([line, count]) => `${line} × ${count}`).join(', ')
}

/** After an issue: what has been cut already and the new roof has no place for. */
export function CutButUnused({ issued }: { issued: Issued | null }) {
  if (!issued || issued.cutButUnused.length === 0) return null
  return (
    <div role="status" className="mb-4">
      <CutButUnusedNote letter={issued.revision.letter} cut={issued.cutButUnused} />
    </div>
  )
}

/** Pieces cut to older revisions that the one of this letter has no place for. */
export function CutButUnusedNote({ letter, cut }: { letter: string; cut: Issued['cutButUnused'] }) {
  return (
    <Note kind="caution" title={`Already cut, and not used in revision ${letter}`}>
      {cut.map(({ letter: cutTo, marks }) => (
        <details key={cutTo}>
          <summary className="min-h-11 content-center">
            Cut to {cutTo}: {byLine(marks)}
          </summary>
          <p>{marks.join(', ')}</p>
        </details>
      ))}
      <p>Tell the crew to put them aside; the pieces of the new roof are planned to be cut.</p>
    </Note>
  )
}
