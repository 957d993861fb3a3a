import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { RainOffList, RainOffPreview } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { PageSkeleton, Skeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { RainOffFields } from './rain-off-fields.tsx'
import { rainOffQueries, useMakeRainOff } from './rain-off-queries.ts'
import { RainOffHeightNote, RainOffResult } from './rain-off-result.tsx'
import { countWords, workingDaysWords } from './rain-off-words.ts'
import { useAnswering } from './use-answering.ts'
import { useRainOffAddress } from './use-rain-off-address.ts'

type Address = ReturnType<typeof useRainOffAddress>
type Asked = RainOffList['rainOffs'][number]

const fieldPaths = ['crew', 'crewId', 'day', 'fromDay', 'days', 'workingDays']

function AskedNote({ asked }: { asked: Asked }) {
  return (
    <Note kind="caution" title={`${asked.askedBy ?? 'Somebody'} asks for this`}>
      <p>
        {asked.crew.name}, {formatDay(asked.fromDay)}, {workingDaysWords(asked.workingDays)}.
        {asked.reason ? ` “${asked.reason}”` : ''}
      </p>
    </Note>
  )
}

function useMaking(crewId: string, address: Address, asked: Asked | undefined) {
  const toast = useToast()
  const answering = useAnswering()
  const make = useMakeRainOff()
  const [clientId] = useState(() => crypto.randomUUID())
  const send = (preview: RainOffPreview) => {
    if (make.isPending) return
    make.mutate(
      {
        clientId,
        ...(asked ? { asked: { id: asked.id, version: asked.version } } : {}),
        crewId,
        fromDay: address.day,
        workingDays: address.days,
        useFreeDays: address.useFreeDays,
        seen: preview.moves.map(({ bookingId, version, daysAfter }) => ({
          bookingId,
          version,
          daysAfter,
        })),
      },
      {
        onSuccess: ({ rainOffs }) => {
          const made = rainOffs.find((one) => one.id === (asked?.id ?? clientId))
          const moved = countWords(preview.moves.length, 'booking')
          toast(`${preview.crew.name}: ${moved} moved on.`, {
            ...(made ? { undo: () => answering.undo(made) } : {}),
          })
          address.close()
        },
      },
    )
  }
  return { make, send }
}

function RainOffForm({ list, address }: { list: RainOffList; address: Address }) {
  const answering = useAnswering()
  const asked = list.rainOffs.find((one) => one.id === address.askedId && one.state === 'asked')
  const crewId = address.crewId ?? asked?.crew.id ?? list.crews[0]?.id ?? ''
  const values = { ...address, crewId }
  const query = useQuery(rainOffQueries.preview(values))
  const { make, send } = useMaking(crewId, address, asked)
  const error = query.error
  const preview = error ? undefined : query.data
  const hasFields = error instanceof ApiFailure && error.error.issues.length > 0
  const count = preview?.moves.length ?? 0
  return (
    <div className="space-y-5">
      {asked ? <AskedNote asked={asked} /> : null}
      <RainOffFields
        crews={list.crews}
        values={values}
        onChange={(changes) => {
          make.reset()
          address.set(changes)
        }}
        issueAt={(path) => issueAt(error, path)}
      />
      {error && !hasFields ? (
        <ErrorState message={error.message} onRetry={() => void query.refetch()} />
      ) : null}
      {!error && !preview ? <Skeleton className="h-48" /> : null}
      {preview ? (
        <div aria-busy={query.isPlaceholderData} className="space-y-5">
          <RainOffResult preview={preview} />
          <RainOffHeightNote />
        </div>
      ) : null}
      <FormFailure error={make.error} shownPaths={fieldPaths} />
      <div className="flex flex-wrap gap-2">
        <Button
          busy={make.isPending}
          disabled={count === 0 || query.isPlaceholderData}
          onClick={() => (preview ? send(preview) : undefined)}
        >
          {count === 0 ? 'Nothing to move' : `Move ${countWords(count, 'booking')}`}
        </Button>
        {asked ? (
          <Button
            kind="danger"
            busy={answering.isPending}
            onClick={() => answering.decline(asked, address.close)}
          >
            Decline
          </Button>
        ) : null}
      </div>
    </div>
  )
}

/** Behind /calendar/rain-off?crew=…&day=…: what a lost day moves, shown before it moves. */
export function RainOffPanel() {
  const address = useRainOffAddress()
  const { data, error, refetch } = useQuery(rainOffQueries.list())
  return (
    <Dialog open place="panel" title="Rain-off" onClose={address.close}>
      {error ? (
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      ) : !data ? (
        <PageSkeleton />
      ) : data.crews.length === 0 ? (
        <EmptyState
          title="There is no crew yet"
          action={
            <Link to="/people" className={buttonClass('plain')}>
              Go to People
            </Link>
          }
        >
          Add a crew and who is in it first.
        </EmptyState>
      ) : (
        <RainOffForm list={data} address={address} />
      )}
    </Dialog>
  )
}
