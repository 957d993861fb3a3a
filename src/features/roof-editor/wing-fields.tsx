import { FlipHorizontal2, RotateCcw } from 'lucide-react'
import type { WingShape, WingsForm } from '../../../shared/revisions/wing-form.ts'
import { wingMeasures } from '../../../shared/revisions/wing-measures.ts'
import { Button } from '../../ui/button.tsx'
import { MeasureField } from './form-fields.tsx'
import { useRoofForm } from './roof-form-context.ts'
import { WingSketch } from './wing-sketch.tsx'

const nextTurn: Record<WingsForm['turn'], WingsForm['turn']> = {
  none: 'left',
  left: 'half',
  half: 'right',
  right: 'none',
}
const turnWords: Record<WingsForm['turn'], string> = {
  none: 'as drawn',
  left: 'turned a quarter to the left',
  half: 'turned half round',
  right: 'turned a quarter to the right',
}

/** The measures of an L, T, U or cross, and how it lies on the page. */
export function WingFields({ shape }: { shape: WingShape }) {
  const { form, setText } = useRoofForm()
  const { turn, mirrored } = form.wings
  const isMirrored = mirrored === 'yes'
  return (
    <>
      <WingSketch form={form} shape={shape} />
      <div className="col-span-2 flex flex-wrap gap-2">
        <Button kind="plain" onClick={() => setText('wings.turn', nextTurn[turn])}>
          <RotateCcw size={18} aria-hidden /> Turn
        </Button>
        <Button
          kind="plain"
          aria-pressed={isMirrored}
          onClick={() => setText('wings.mirrored', isMirrored ? 'no' : 'yes')}
        >
          <FlipHorizontal2 size={18} aria-hidden /> Mirror
        </Button>
        <p role="status" className="sr-only">
          {`The shape lies ${turnWords[turn]}${isMirrored ? ', mirrored' : ''}.`}
        </p>
      </div>
      {wingMeasures[shape].map(({ letter, path, label, ifEmpty }) => (
        <MeasureField key={path} path={path} label={`${letter} · ${label}`} hint={ifEmpty} />
      ))}
    </>
  )
}
