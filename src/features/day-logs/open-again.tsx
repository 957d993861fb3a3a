import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { DayToClose } from '../../../shared/day-logs/day-log-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { useToast } from '../../ui/toast.tsx'
import { dayLogQueries, takeBackDayLog } from './day-log-queries.ts'

/** A day closed by mistake is opened again; asks once, naming what goes. */
export function OpenAgain({ day }: { day: DayToClose }) {
  const [isAsking, setAsking] = useState(false)
  const client = useQueryClient()
  const toast = useToast()
  const takeBack = useMutation({
    mutationFn: (version: number) => takeBackDayLog(day.bookingDayId, version),
    onSuccess: (now) => {
      client.setQueryData(dayLogQueries.day(day.bookingDayId).queryKey, now)
      void client.invalidateQueries({ queryKey: ['day-sheet'] })
      toast('The day is open again.')
    },
  })
  const { log } = day
  if (!log) return null
  if (!isAsking)
    return (
      <Button kind="quiet" size="site" onClick={() => setAsking(true)}>
        Take the whole log back
      </Button>
    )
  return (
    <div role="group" aria-label="Take the log back" className="space-y-2">
      <p className="font-semibold">
        The hours, delays and remarks of {formatDay(day.day)} by {log.loggedBy} go, and the day
        counts as not closed.
      </p>
      <FormFailure error={takeBack.error} />
      <div className="flex flex-wrap gap-2">
        <Button
          kind="danger"
          size="site"
          busy={takeBack.isPending}
          onClick={() => takeBack.mutate(log.version)}
        >
          Take it back
        </Button>
        <Button kind="plain" size="site" onClick={() => setAsking(false)}>
          Leave it
        </Button>
      </div>
    </div>
  )
}
