import { startTransition, useEffect, useMemo, useRef, useState } from 'react'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import {
  type FormFirm,
  type FormReading,
  refusedReading,
  typedRoof,
} from '../../../shared/revisions/roof-of-form.ts'
import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import type { LayOutPlan } from '../../drawings/use-laid-plan.ts'
import { type Answered, type FrameLine, openFrameLine } from './frame-line.ts'

export type Framed = {
  roof: Roof
  spec: FrameSpec | null
  message: string | null
  /** Lays out its plan beside the screen. */
  layOut: LayOutPlan | undefined
}

export type RoofReading = { reading: FormReading; framed: Framed | null }

/**
 * What is typed, read at once; whether it can be framed and its frame, worked out beside the screen. The
 * last answer stands until the next is there.
 */
export function useFramedRoof(form: RoofForm, firm: FormFirm): RoofReading {
  const line = useRef<FrameLine | null>(null)
  const [answered, setAnswered] = useState<Answered | null>(null)
  useEffect(() => {
    const opened = openFrameLine((answer) => startTransition(() => setAnswered(answer)))
    line.current = opened
    return () => {
      opened.close()
      line.current = null
    }
  }, [])
  const typed = useMemo(() => typedRoof(form, firm), [form, firm])
  const isRead = typed.problems.length === 0
  useEffect(() => {
    if (isRead) line.current?.ask(form, firm)
  }, [form, firm, isRead])
  return useMemo(() => {
    const { drawn, problems } = typed
    if (problems.length > 0) return { reading: refusedReading(drawn, problems, []), framed: null }
    return answered ? readingOf(answered, form, drawn) : { reading: ready(drawn), framed: null }
  }, [typed, answered, form])
}

const ready = (roof: Roof): FormReading => ({ roof, problems: null })

function readingOf(answered: Answered, current: RoofForm, drawn: Roof): RoofReading {
  const { form, frame, layOut } = answered
  if (!frame) {
    const message = 'This roof could not be framed.'
    return {
      reading: ready(drawn),
      framed: { roof: drawn, spec: null, message, layOut: undefined },
    }
  }
  const { reading, spec } = frame
  if (reading.roof === null) {
    const { problems, drawnProblems } = reading
    return { reading: refusedReading(drawn, problems, drawnProblems), framed: null }
  }
  const isCurrent = form === current
  return {
    reading: isCurrent ? reading : ready(drawn),
    framed: { roof: reading.roof, spec, message: null, layOut },
  }
}
