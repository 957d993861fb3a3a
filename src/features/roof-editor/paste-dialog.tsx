import { useState } from 'react'
import {
  cornersOfPaste,
  type Pasted,
  type PastedUnit,
} from '../../../shared/outline/pasted-corners.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'
import { formatMm } from '../../../shared/units/format-length.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Field } from '../../ui/field.tsx'
import { TextArea } from '../../ui/inputs.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { roofGlyphOf } from '../../../shared/drawing/roof-glyph.ts'

const units = [
  { value: 'guess', label: 'Worked out' },
  { value: 'mm', label: 'mm' },
  { value: 'm', label: 'm' },
] as const

type Props = { open: boolean; onClose: () => void; onTake: (corners: Point2[]) => void }

/** Corners copied from a plan, read as they are pasted and taken when they are right. */
export function PasteDialog({ open, onClose, onTake }: Props) {
  return (
    <Dialog open={open} onClose={onClose} title="Paste coordinates">
      <PasteForm
        onTake={(corners) => {
          onTake(corners)
          onClose()
        }}
      />
    </Dialog>
  )
}

function PasteForm({ onTake }: Pick<Props, 'onTake'>) {
  const [text, setText] = useState('')
  const [unit, setUnit] = useState<PastedUnit | 'guess'>('guess')
  const pasted = cornersOfPaste(text, unit)
  const isEmpty = text.trim() === ''
  return (
    <div className="space-y-4">
      <Field
        label="Corners, one a line: x, then y"
        hint="Parted by a comma, a semicolon, a tab or spaces. x to the right, y up."
      >
        <TextArea
          rows={8}
          spellCheck={false}
          className="font-mono tabular-nums"
          placeholder={'0, 0\n9000, 0\n9000, 4000'}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </Field>
      <div className="flex flex-wrap items-center gap-3">
        <span className="font-semibold">Figures are in</span>
        <Segmented label="Figures are in" options={units} value={unit} onChange={setUnit} />
      </div>
      <div role="status">
        {isEmpty ? null : pasted.problems.length > 0 ? (
          <PasteProblems pasted={pasted} />
        ) : (
          <PasteWords pasted={pasted} />
        )}
      </div>
      <Button disabled={pasted.corners.length === 0} onClick={() => onTake(pasted.corners)}>
        {pasted.corners.length > 0 ? `Take these ${pasted.corners.length} corners` : 'Take them'}
      </Button>
    </div>
  )
}

const mostShown = 5

function PasteProblems({ pasted: { problems } }: { pasted: Pasted }) {
  return (
    <ul className="space-y-1 font-semibold text-stop">
      {problems.slice(0, mostShown).map(({ line, message }) => (
        <li key={line}>{`Line ${line}: ${message}`}</li>
      ))}
      {problems.length > mostShown ? (
        <li>{`and ${problems.length - mostShown} more lines.`}</li>
      ) : null}
    </ul>
  )
}

/** What was made of it, so that a wrong guess is seen before it is taken. */
function PasteWords({ pasted }: { pasted: Pasted }) {
  const { corners, unit, isUnitGuessed, wasTurned, wasClosed } = pasted
  const span = (values: number[]) => formatMm(Math.max(...values) - Math.min(...values))
  const [wide, deep] = [span(corners.map((p) => p.x)), span(corners.map((p) => p.y))]
  const told = [
    `${corners.length} corners, ${wide} by ${deep} mm over all.`,
    isUnitGuessed ? `Taken for ${unit === 'm' ? 'metres' : 'millimetres'}.` : '',
    wasClosed ? 'The last line repeats the first and was left out.' : '',
    wasTurned ? 'They ran clockwise and were turned round.' : '',
  ]
  return (
    <div className="flex items-center gap-4">
      <RoofGlyph glyph={roofGlyphOf(null, { outline: corners })} sizePx={72} />
      <p>{told.filter(Boolean).join(' ')}</p>
    </div>
  )
}
