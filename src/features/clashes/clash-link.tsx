import { useQuery } from '@tanstack/react-query'
import { OctagonAlert } from 'lucide-react'
import { Link, useLocation } from 'react-router-dom'
import { buttonClass } from '../../ui/button.tsx'
import { clashQueries } from './clash-queries.ts'

/** How many clashes are still to be settled; opens the list, cautions with it. */
export function ClashLink() {
  const { search } = useLocation()
  const { data } = useQuery(clashQueries.list())
  const count = data?.clashes.filter((clash) => clash.weight === 'clash').length
  return (
    <Link
      className={`${buttonClass('plain')} ${count ? 'text-stop!' : ''}`}
      to={`/calendar/clashes${search}`}
    >
      <OctagonAlert size={20} aria-hidden />
      Clashes{count === undefined ? '' : ` (${count})`}
    </Link>
  )
}
