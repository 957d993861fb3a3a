import { useNavigate, useSearchParams } from 'react-router-dom'
import { clashCodes } from '../../../shared/clashes/clash-schemas.ts'
import type { ClashFilter } from './clash-view.ts'

const keys = ['q', 'weight', 'what', 'crew'] as const
const weights = ['clash', 'caution'] as const

/** Filters of the list, in the address beside the calendar's own. */
export function useClashAddress() {
  const navigate = useNavigate()
  const [search, setSearch] = useSearchParams()
  const filter: ClashFilter = {
    q: search.get('q') ?? '',
    weight: weights.find((weight) => weight === search.get('weight')) ?? null,
    what: clashCodes.find((code) => code === search.get('what')) ?? null,
    crew: search.get('crew'),
  }
  const change = (changes: Partial<ClashFilter>) =>
    setSearch(
      (now) => {
        for (const key of keys) {
          if (!(key in changes)) continue
          const value = changes[key]
          if (value) now.set(key, value)
          else now.delete(key)
        }
        return now
      },
      // At once, or the caret jumps while typing.
      { replace: true, flushSync: true },
    )
  const rest = new URLSearchParams(search)
  for (const key of keys) rest.delete(key)
  const calendarSearch = rest.size > 0 ? `?${rest.toString()}` : ''
  return {
    filter,
    change,
    isFiltered: keys.some((key) => Boolean(filter[key])),
    showAll: () => change({ q: '', weight: null, what: null, crew: null }),
    /** The calendar's part of the address. */
    calendarSearch,
    close: () => void navigate(`/calendar${calendarSearch}`),
  }
}
