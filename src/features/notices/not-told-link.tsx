import { useQuery } from '@tanstack/react-query'
import { Megaphone } from 'lucide-react'
import { Link, useLocation } from 'react-router-dom'
import { useMay } from '../../lib/session.ts'
import { buttonClass } from '../../ui/button.tsx'
import { noticeQueries } from './notice-queries.ts'
import { stillToTell } from './not-told-words.ts'

/** How many people have not been told what changed; opens the list. */
export function NotToldLink() {
  const mayRead = useMay('notice:read')
  const { search } = useLocation()
  const { data } = useQuery({ ...noticeQueries.list(), enabled: mayRead })
  if (!mayRead) return null
  const count = stillToTell(data?.people ?? []).length
  return (
    <Link className={buttonClass('plain')} to={`/calendar/not-told${search}`}>
      <Megaphone size={20} aria-hidden />
      Not yet told{data ? ` (${count})` : ''}
    </Link>
  )
}
