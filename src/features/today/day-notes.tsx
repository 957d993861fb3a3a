import { workAtHeight } from '../../../shared/marking/marking-card.ts'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
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
  return (
    <>
      {sheet.cautions.map((caution) => (
        <Note key={caution.text} kind="caution" title="Caution">
          <p className="text-base">{caution.text}</p>
          <p className="text-base">{caution.remedy}</p>
        </Note>
      ))}
    </>
  )
}

export function HeightNote() {
  return (
    <Note kind="stop" title="Working at height">
      <p className="text-base">{workAtHeight}</p>
    </Note>
  )
}
