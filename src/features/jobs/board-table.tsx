import {
  createColumnHelper,
  createSortedRowModel,
  rowSortingFeature,
  type SortingState,
  sortFn_alphanumeric,
  sortFn_basic,
  sortFn_text,
  tableFeatures,
  useTable,
} from '@tanstack/react-table'
import { ArrowDown, ArrowUp, ArrowUpDown } from 'lucide-react'
import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import { jobStageNames, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { JobCard as Card } from '../../../shared/jobs/job-views.ts'
import { formatPrice } from '../../../shared/jobs/price-text.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { useMay, useSession } from '../../lib/session.ts'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { bookingDaysText, dayText } from './day-words.ts'
import { JobCard } from './job-card.tsx'
import { missingText } from './missing-text.ts'

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric, text: sortFn_text, basic: sortFn_basic },
})
const column = createColumnHelper<typeof features, Card>()

function NextBooking({ card }: { card: Card }) {
  const { today } = useSession().firm
  const { nextBooking: booking } = card
  if (!booking) return <span className="text-ink-soft">–</span>
  return (
    <span className="flex items-center gap-2 whitespace-nowrap">
      <CrewPennant {...booking.crew} />
      {bookingDaysText(booking, today)}
      {booking.state === 'pencilled' ? <span className="text-ink-soft">in pencil</span> : null}
    </span>
  )
}

function WantedBy({ card }: { card: Card }) {
  const { today } = useSession().firm
  return card.wantedBy && card.stage !== 'complete' ? (
    <span className="whitespace-nowrap">{dayText(card.wantedBy, today)}</span>
  ) : (
    <span className="text-ink-soft">–</span>
  )
}

const stageColumn = column.accessor((card) => jobStages.indexOf(card.stage), {
  id: 'stage',
  header: 'Stage',
  sortFn: 'basic',
  cell: ({ row }) => jobStageNames[row.original.stage],
})

const plainColumns = column.columns([
  column.accessor('number', {
    header: 'Number',
    sortFn: 'alphanumeric',
    cell: ({ row }) => (
      <Link
        to={`/jobs/${row.original.id}`}
        className="-my-2.5 inline-flex min-h-11 items-center whitespace-nowrap font-extrabold text-chalk underline"
      >
        {row.original.number}
      </Link>
    ),
  }),
  column.accessor('title', {
    header: 'Job',
    sortFn: 'text',
    cell: ({ row }) => (
      <>
        <span className="block font-semibold [overflow-wrap:anywhere]">{row.original.title}</span>
        <span className="block text-sm text-ink-soft [overflow-wrap:anywhere]">
          {row.original.siteAddress}
        </span>
      </>
    ),
  }),
  stageColumn,
  column.accessor((card) => card.nextBooking?.startsOn, {
    id: 'booked',
    header: 'Booked',
    sortFn: 'basic',
    sortUndefined: 'last',
    cell: ({ row }) => <NextBooking card={row.original} />,
  }),
  column.accessor(
    (card) => (card.stage === 'complete' ? undefined : (card.wantedBy ?? undefined)),
    {
      id: 'wanted',
      header: 'Wanted by',
      sortFn: 'basic',
      sortUndefined: 'last',
      cell: ({ row }) => <WantedBy card={row.original} />,
    },
  ),
  column.accessor((card) => card.latestLetter ?? undefined, {
    id: 'roof',
    header: 'Roof',
    sortFn: 'text',
    sortUndefined: 'last',
    cell: ({ row }) => row.original.latestLetter ?? (row.original.hasDraft ? 'Draft' : '–'),
  }),
  column.accessor((card) => card.missing.length, {
    id: 'missing',
    header: 'Missing',
    sortFn: 'basic',
    cell: ({ row }) => (
      <span className="text-sm text-ochre">{missingText(row.original.missing)}</span>
    ),
  }),
])

const priceColumn = column.accessor((card) => card.priceCents ?? undefined, {
  id: 'price',
  header: 'Price',
  sortFn: 'basic',
  sortUndefined: 'last',
  cell: ({ row }) => {
    const { priceCents } = row.original
    return (
      <span className="block whitespace-nowrap text-right tabular-nums">
        {typeof priceCents === 'number' ? formatPrice(priceCents) : '–'}
      </span>
    )
  },
})

/** With prices last, for who may see them. */
const pricedColumns = column.columns([...plainColumns, priceColumn])

/** Headings and their names, for the choice on a phone. */
const sortNames: readonly [id: string, name: string][] = [
  ['number', 'Number'],
  ['title', 'Job'],
  ['stage', 'Stage'],
  ['booked', 'Booked'],
  ['wanted', 'Wanted by'],
  ['roof', 'Roof'],
  ['missing', 'Missing'],
]

function SortOptions({ sort, withPrices }: { sort: BoardSort; withPrices: boolean }) {
  const names = withPrices ? [...sortNames, ['price', 'Price'] as const] : sortNames
  const descending = names.find(([id]) => sort === `-${id}`)
  const isAmount = descending?.[0] === 'price' || descending?.[0] === 'missing'
  return (
    <>
      <option value="">Stage, soonest first</option>
      {names.map(([id, name]) => (
        <option key={id} value={id}>
          {name}
        </option>
      ))}
      {descending ? (
        <option value={sort}>{`${descending[1]}, ${isAmount ? 'most' : 'last'} first`}</option>
      ) : null}
    </>
  )
}

/** 'wanted', or '-wanted' for the latest first, as it stands in the address. */
export type BoardSort = string

function sortingOf(sort: BoardSort): SortingState {
  if (sort === '') return []
  const desc = sort.startsWith('-')
  return [{ id: desc ? sort.slice(1) : sort, desc }]
}

const sortText = ([first]: SortingState): BoardSort =>
  first ? `${first.desc ? '-' : ''}${first.id}` : ''

function SortMark({ sorted }: { sorted: false | 'asc' | 'desc' }) {
  const Mark = sorted === 'asc' ? ArrowUp : sorted === 'desc' ? ArrowDown : ArrowUpDown
  return <Mark size={16} aria-hidden className={sorted ? '' : 'text-ink-soft'} />
}

const ariaSort = { asc: 'ascending', desc: 'descending' } as const

type Props = { cards: Card[]; sort: BoardSort; onSort: (sort: BoardSort) => void }

/** The board as a table, sorted by any heading; cards in the same order on a phone. */
export function BoardTable({ cards, sort, onSort }: Props) {
  const maySeePrices = useMay('price:read')
  const columns = maySeePrices ? pricedColumns : plainColumns
  const sorting = useMemo(() => sortingOf(sort), [sort])
  const table = useTable({
    features,
    columns,
    data: cards,
    getRowId: (card) => card.id,
    state: { sorting },
    onSortingChange: (next) => onSort(sortText(typeof next === 'function' ? next(sorting) : next)),
  })
  const rows = table.getRowModel().rows
  return (
    <>
      <div className="sm:hidden">
        <Field label="In the order of" className="mb-3">
          <Select value={sort} onChange={(event) => onSort(event.target.value)}>
            <SortOptions sort={sort} withPrices={maySeePrices} />
          </Select>
        </Field>
        <ul className="space-y-2">
          {rows.map((row) => (
            <li key={row.id}>
              <JobCard card={row.original} />
            </li>
          ))}
        </ul>
      </div>
      <div className="hidden overflow-x-auto rounded-md border border-rule bg-sheet sm:block">
        <table className="w-full border-collapse text-left">
          <thead>
            {table.getHeaderGroups().map((group) => (
              <tr key={group.id} className="border-b-2 border-ink-soft">
                {group.headers.map((header) => {
                  const sorted = header.column.getIsSorted()
                  return (
                    <th
                      key={header.id}
                      scope="col"
                      aria-sort={sorted ? ariaSort[sorted] : undefined}
                      className="px-2"
                    >
                      <button
                        type="button"
                        className="flex min-h-11 items-center gap-1 whitespace-nowrap font-semibold"
                        onClick={header.column.getToggleSortingHandler()}
                      >
                        <table.FlexRender header={header} />
                        <SortMark sorted={sorted} />
                      </button>
                    </th>
                  )
                })}
              </tr>
            ))}
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.id} className="border-b border-rule align-top last:border-0">
                {row.getAllCells().map((cell) => (
                  <td key={cell.id} className="px-2 py-2">
                    <table.FlexRender cell={cell} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  )
}
