import { startTransition, useEffect, useState } from 'react'
import type { RoofReading } from './use-framed-roof.ts'

const fineAfterMs = 150
const refusedAfterMs = 700
const restMs = 350

/**
 * What the results show of a roof under way: a frame once typing pauses, a refusal once it rests, so that
 * the plan neither comes and goes while '25' is typed by way of '2' nor is drawn for every key.
 */
export function useSteadyReading(now: RoofReading): RoofReading {
  const [rested, setRested] = useState(now)
  const isFine = now.reading.roof !== null && now.framed !== null
  useEffect(() => {
    if (now === rested) return
    const timer = setTimeout(
      () => startTransition(() => setRested(now)),
      isFine ? fineAfterMs : refusedAfterMs,
    )
    return () => clearTimeout(timer)
  }, [now, rested, isFine])
  const wasFine = rested.reading.roof !== null && rested.framed !== null
  return wasFine ? rested : now
}

/** Follows a value once it has stood still for a moment, in a pass that typing can interrupt. */
export function useRestedValue<Value>(value: Value): Value {
  const [rested, setRested] = useState(value)
  useEffect(() => {
    if (value === rested) return
    const timer = setTimeout(() => startTransition(() => setRested(value)), restMs)
    return () => clearTimeout(timer)
  }, [value, rested])
  return rested
}
