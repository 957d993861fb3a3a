import { startTransition, useEffect, useRef, useState } from 'react'
import type { FrameSpec, Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'
import type { FrameAnswer, FrameQuestion } from './frame-messages.ts'

export type Framed = { roof: Roof; spec: FrameSpec | null; message: string | null }

type Line = { ask: (roof: Roof, settings: RoofSettings) => void; close: () => void }

/** One question at a time; of those that queue up while it works, only the newest is asked. */
function openLine(onAnswer: (framed: Framed) => void): Line {
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
    if (answered?.id === data.id) {
      onAnswer({ roof: answered.roof, spec: data.spec, message: data.message })
    }
    send()
  }
  return {
    ask(roof, settings) {
      next = { id: ++count, roof, settings }
      send()
    },
    close: () => worker.terminate(),
  }
}

/** The frame of a roof, worked out beside the screen; the last answer stands until the next is there. */
export function useFramedRoof(roof: Roof | null, settings: RoofSettings): Framed | null {
  const line = useRef<Line | null>(null)
  const [framed, setFramed] = useState<Framed | null>(null)
  useEffect(() => {
    const opened = openLine((answer) => startTransition(() => setFramed(answer)))
    line.current = opened
    return () => {
      opened.close()
      line.current = null
    }
  }, [])
  useEffect(() => {
    if (roof) line.current?.ask(roof, settings)
  }, [roof, settings])
  return roof ? framed : null
}
