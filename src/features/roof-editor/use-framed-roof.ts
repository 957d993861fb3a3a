import { startTransition, useEffect, useMemo, useRef, useState } from 'react'
import type { FormFrame } from '../../../shared/revisions/frame-of-form.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import {
  type FormFirm,
  type FormReading,
  refusedReading,
  typedRoof,
} from '../../../shared/revisions/roof-of-form.ts'
import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import type { FrameAnswer, FrameQuestion } from './frame-messages.ts'

export type Framed = { roof: Roof; spec: FrameSpec | null; message: string | null }

type Answered = { form: RoofForm; frame: FormFrame | null }
type Line = { ask: (form: RoofForm, firm: FormFirm) => void; close: () => void }

/** One question at a time; of those that queue up while it works, only the newest is asked. */
function openLine(onAnswer: (answered: Answered) => void): Line {
  const worker = new Worker(new URL('./frame-worker.ts', import.meta.url), { type: 'module' })
  let asked: FrameQuestion | null = null
  let next: FrameQuestion | null = null
  let count = 0
  const send = () => {
    if (asked !== null || next === null) return
    asked = next
    next = null
    worker.postMessage(asked)
  }
  worker.onmessage = ({ data }: MessageEvent<FrameAnswer>) => {
    const answered = asked
    asked = null
    if (answered?.id === data.id) onAnswer({ form: answered.form, frame: data.frame })
    send()
  }
  return {
    ask(form, firm) {
      next = { id: ++count, form, firm }
      send()
    },
    close: () => worker.terminate(),
  }
}

export type RoofReading = { reading: FormReading; framed: Framed | null }

/**
 * What is typed, read at once; whether it can be framed and its frame, worked out beside the screen. The
 * last answer stands until the next is there.
 */
export function useFramedRoof(form: RoofForm, firm: FormFirm): RoofReading {
  const line = useRef<Line | null>(null)
  const [answered, setAnswered] = useState<Answered | null>(null)
  useEffect(() => {
    const opened = openLine((answer) => startTransition(() => setAnswered(answer)))
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

function readingOf({ form, frame }: Answered, current: RoofForm, drawn: Roof): RoofReading {
  if (!frame) {
    const message = 'This roof could not be framed.'
    return { reading: ready(drawn), framed: { roof: drawn, spec: null, message } }
  }
  const { reading, spec } = frame
  if (reading.roof === null) {
    const { problems, drawnProblems } = reading
    return { reading: refusedReading(drawn, problems, drawnProblems), framed: null }
  }
  const isCurrent = form === current
  return {
    reading: isCurrent ? reading : ready(drawn),
    framed: { roof: reading.roof, spec, message: null },
  }
}
