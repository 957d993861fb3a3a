import { useQuery } from '@tanstack/react-query'
import { Printer } from 'lucide-react'
import type { ReactNode } from 'react'
import { useSearchParams } from 'react-router-dom'
import { formatDay, formatDayWithYear } from '../../../shared/calendar/days.ts'
import type { DaySheets } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { useMay, useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PrintFoot } from '../../ui/print-foot.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { SunlightSwitch } from '../../ui/sunlight-switch.tsx'
import { AnyDay, DaySwitcher } from './day-switcher.tsx'
import { dayTitle } from './day-words.ts'
import { SheetView } from './sheet-view.tsx'
import { todayQueries } from './today-queries.ts'

/** Day and crew live in the address, so that a link in a mail opens the right sheet. */
function useWhich() {
  const [params, setParams] = useSearchParams()
  const set = (key: 'day' | 'crew', value: string) =>
    setParams((now) => {
      const next = new URLSearchParams(now)
      next.set(key, value)
      return next
    })
  return { day: params.get('day'), crewId: params.get('crew'), set }
}

function CrewPicker({ sheets, onCrew }: { sheets: DaySheets; onCrew: (id: string) => void }) {
  if (sheets.crews.length < 2) return null
  return (
    <Field label="Crew" className="mb-4 max-w-sm print:hidden">
      <Select
        className="min-h-14"
        value={sheets.crew?.id ?? ''}
        onChange={(event) => onCrew(event.target.value)}
      >
        {sheets.crews.map((crew) => (
          <option key={crew.id} value={crew.id}>
            {crew.name}
          </option>
        ))}
      </Select>
    </Field>
  )
}

function NothingBooked({ sheets, onDay }: { sheets: DaySheets; onDay: (day: string) => void }) {
  const mayWriteCrews = useMay('crew:write')
  const { nextDay } = sheets
  return (
    <EmptyState
      title="Nothing booked this day"
      action={
        nextDay ? (
          <Button size="site" onClick={() => onDay(nextDay)}>
            Open {formatDay(nextDay)}
          </Button>
        ) : null
      }
    >
      {sheets.crew
        ? nextDay
          ? `${sheets.crew.name} is next booked on ${formatDay(nextDay)}.`
          : `${sheets.crew.name} has no later day that you may see. Ask the office.`
        : mayWriteCrews
          ? 'There is no crew yet. Make one under People.'
          : 'You are in no crew that day. Ask the office.'}
    </EmptyState>
  )
}

/** What another feature puts over and under a crew's day. */
type Slot = (which: { crewId: string; day: string }) => ReactNode
type Slots = { head: Slot; foot: Slot }

function TodayBody({
  sheets,
  set,
  head,
  foot,
}: {
  sheets: DaySheets
  set: ReturnType<typeof useWhich>['set']
} & Slots) {
  const which = sheets.crew ? { crewId: sheets.crew.id, day: sheets.day } : null
  const { firm } = useSession()
  const jobs = sheets.sheets.map(({ job, revision }) =>
    [job.number, revision ? `revision ${revision.letter}` : ''].filter(Boolean).join(', '),
  )
  return (
    <>
      <PageHeader
        title={dayTitle(sheets.day, sheets.today)}
        lead={
          sheets.crew ? (
            <span className="inline-flex items-center gap-2 text-ink">
              <CrewPennant
                letter={sheets.crew.letter}
                colour={sheets.crew.colour}
                name={sheets.crew.name}
              />
              {sheets.crew.name}
            </span>
          ) : null
        }
        actions={
          <>
            <SunlightSwitch />
            <AnyDay sheets={sheets} onDay={(day) => set('day', day)} />
            {/* Paper is printed at the desk. */}
            <div className="hidden sm:block">
              <Button kind="plain" size="site" onClick={() => window.print()}>
                <Printer size={22} aria-hidden />
                Print
              </Button>
            </div>
          </>
        }
      />
      <DaySwitcher sheets={sheets} onDay={(day) => set('day', day)} />
      <CrewPicker sheets={sheets} onCrew={(id) => set('crew', id)} />
      {which ? head(which) : null}
      <PrintFoot
        left={`${firm.name}: ${jobs.join('; ')}`}
        middle={`Day sheet ${formatDayWithYear(sheets.day)}`}
      />
      {sheets.sheets.length === 0 ? (
        <NothingBooked sheets={sheets} onDay={(day) => set('day', day)} />
      ) : (
        <div className="space-y-8">
          {sheets.sheets.map((sheet) => (
            <SheetView key={sheet.bookingDayId} sheet={sheet} today={sheets.today} />
          ))}
        </div>
      )}
      {which ? foot(which) : null}
    </>
  )
}

/** What a crew needs on the day, read on a phone in the sun. */
export function TodayPage(slots: Slots) {
  const { day, crewId, set } = useWhich()
  const query = useQuery(todayQueries.sheets({ day, crewId }))
  if (query.isPending) return <PageSkeleton />
  if (query.isError)
    return (
      <>
        <PageHeader title="Today" />
        <ErrorState
          message={failureText(query.error) ?? query.error.message}
          onRetry={() => void query.refetch()}
        />
      </>
    )
  return (
    <div className="site-screen" aria-busy={query.isPlaceholderData}>
      <TodayBody sheets={query.data} set={set} {...slots} />
    </div>
  )
}
