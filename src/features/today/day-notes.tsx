import { workAtHeight } from '../../../shared/marking/marking-card.ts'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { Fold } from '../../ui/fold.tsx'
import { Note } from '../../ui/states.tsx'

/** What is not as it was the day before. */
export function ChangesNote({ sheet }: { sheet: DaySheet }) {
  if (sheet.changes.length === 0) return null
  return (
    <Note kind="caution" title="Changed since the day before">
      <ul className="list-disc pl-6 text-base">
        {sheet.changes.map((text) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
    </Note>
  )
}

/** Cautions of the roof that concern what is handled this day. */
export function CautionNotes({ sheet }: { sheet: DaySheet }) {
  const { cautions } = sheet
  if (cautions.length === 0) return null
  return (
    <Note kind="caution" title={cautions.length === 1 ? 'Caution' : 'Cautions'}>
      <ul className="list-disc pl-6 text-base">
        {cautions.map(({ text }) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
      <Fold title="What answers them">
        <ul className="list-disc space-y-2 pl-6 text-base">
          {cautions.map(({ text, remedy }) => (
            <li key={text}>{remedy}</li>
          ))}
        </ul>
      </Fold>
    </Note>
  )
}

export function HeightNote() {
  return (
    <Note kind="stop" title="Working at height">
      <p className="text-base">{workAtHeight}</p>
    </Note>
  )
}
