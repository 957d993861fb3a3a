import { useNavigate, useSearchParams } from 'react-router-dom'
import { daySchema } from '../../../shared/http/fields.ts'
import { mostRainOffDays } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { useSession } from '../../lib/session.ts'

const own = ['crew', 'day', 'days', 'free', 'asked'] as const
export type RainOffKey = (typeof own)[number]

/** What is looked at, kept in the address beside the calendar's own. */
export function useRainOffAddress() {
  const { firm } = useSession()
  const navigate = useNavigate()
  const [search, setSearch] = useSearchParams()
  const day = search.get('day') ?? ''
  const days = Number(search.get('days') ?? '1')
  const isCount = Number.isInteger(days) && days >= 1 && days <= mostRainOffDays
  const set = (changes: Partial<Record<RainOffKey, string>>) =>
    setSearch(
      (now) => {
        for (const [key, value] of Object.entries(changes)) now.set(key, value)
        return now
      },
      { replace: true },
    )
  const close = () => {
    const rest = new URLSearchParams(search)
    for (const key of own) rest.delete(key)
    const text = rest.toString()
    void navigate(`/calendar${text ? `?${text}` : ''}`)
  }
  return {
    crewId: search.get('crew'),
    day: daySchema.safeParse(day).success ? day : firm.today,
    days: isCount ? days : 1,
    useFreeDays: search.get('free') === 'use',
    askedId: search.get('asked'),
    set,
    close,
  }
}
