import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useEffect, useRef, useState } from 'react'
import { z } from 'zod'
import {
  type DayLog,
  dayLogSchema,
  type DayToClose,
  type WriteDayLog,
} from '../../../shared/day-logs/day-log-schemas.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { useUser } from '../../lib/session.ts'
import { useToast } from '../../ui/toast.tsx'
import { dayLogQueries, takeBackDayLog, writeDayLog } from './day-log-queries.ts'
import { keepLog, readKeptLog } from './kept-log.ts'
import { asWritten, logToStart } from './log-form.ts'

const staleSchema = z.object({ kind: z.literal('stale'), current: dayLogSchema.nullable() })

/** What stands on the server now, when the log sent was made from an older one. */
export function staleLogOf(error: unknown): DayLog | null {
  if (!(error instanceof ApiFailure)) return null
  const parsed = staleSchema.safeParse(error.error.detail)
  return parsed.success ? parsed.data.current : null
}

const didNotArrive = (error: unknown) => error instanceof ApiFailure && error.status === 0

/** A day's log as it is put down: kept on this device until it has arrived. */
export function useCloseDay(day: DayToClose, onDone: () => void) {
  const user = useUser()
  const client = useQueryClient()
  const toast = useToast()
  const { bookingDayId } = day
  const [kept] = useState(() => readKeptLog(user.id, bookingDayId))
  const [log, setLog] = useState<WriteDayLog>(kept ?? logToStart(day))
  const show = (now: DayToClose) => {
    client.setQueryData(dayLogQueries.day(bookingDayId).queryKey, now)
    void client.invalidateQueries({ queryKey: ['day-sheet'] })
  }
  const takeBack = useMutation({
    mutationFn: (version: number) => takeBackDayLog(bookingDayId, version),
    onSuccess: show,
    onError: (error) => toast(error.message, { kind: 'stop' }),
  })
  const restore = useMutation({
    mutationFn: (was: WriteDayLog) => writeDayLog(bookingDayId, was),
    onSuccess: show,
    onError: (error) => toast(error.message, { kind: 'stop' }),
  })
  const save = useMutation({
    mutationFn: (written: WriteDayLog) => writeDayLog(bookingDayId, written),
    // A dead line is said at once, and tried again when it is back.
    networkMode: 'always',
    onMutate: (written) => keepLog(user.id, bookingDayId, written),
    onSuccess: (now, written) => {
      keepLog(user.id, bookingDayId, null)
      show(now)
      const before =
        day.log && day.log.version === written.version ? asWritten(day.log, day.day) : null
      const version = now.log?.version ?? 0
      toast(before ? 'Log corrected.' : 'Day closed.', {
        undo: () => (before ? restore.mutate({ ...before, version }) : takeBack.mutate(version)),
      })
      onDone()
    },
  })
  useSendWhenBack(didNotArrive(save.error), () => save.mutate(log))
  const change = (part: Partial<WriteDayLog>) => {
    const next = { ...log, ...part }
    setLog(next)
    keepLog(user.id, bookingDayId, next)
  }
  return {
    log,
    wasKept: kept !== null,
    change,
    save,
    takeBack,
    /** Drops what was typed for what the server has. */
    startAgain(from: WriteDayLog = logToStart(day)) {
      keepLog(user.id, bookingDayId, null)
      save.reset()
      setLog(from)
    },
  }
}

function useSendWhenBack(isWaiting: boolean, send: () => void): void {
  const latest = useRef(send)
  useEffect(() => {
    latest.current = send
  })
  useEffect(() => {
    if (!isWaiting) return
    const onBack = () => latest.current()
    window.addEventListener('online', onBack)
    return () => window.removeEventListener('online', onBack)
  }, [isWaiting])
}
