import { useNavigate, useSearchParams } from 'react-router-dom'

const own = ['job', 'from', 'days'] as const
export type FindDaysKey = (typeof own)[number]

/** The job and what narrows the search, kept in the address beside the calendar's own. */
export function useFindDaysAddress() {
  const navigate = useNavigate()
  const [search, setSearch] = useSearchParams()
  const set = (changes: Partial<Record<FindDaysKey, string>>) =>
    setSearch(
      (now) => {
        for (const [key, value] of Object.entries(changes))
          if (value === '') now.delete(key)
          else now.set(key, value)
        return now
      },
      { replace: true },
    )
  /** Back to the calendar; on the day that was taken, when one was. */
  const close = (day?: string) => {
    const rest = new URLSearchParams(search)
    for (const key of own) rest.delete(key)
    if (day !== undefined) rest.set('on', day)
    const text = rest.toString()
    void navigate(`/calendar${text ? `?${text}` : ''}`)
  }
  return {
    jobId: search.get('job') ?? '',
    from: search.get('from') ?? '',
    days: search.get('days') ?? '',
    set,
    close,
  }
}
