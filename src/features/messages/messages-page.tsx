import { useInfiniteQuery } from '@tanstack/react-query'
import { Outlet } from 'react-router-dom'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useSettled } from '../../lib/use-settled.ts'
import { Button } from '../../ui/button.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { useMessageAddress } from './message-address.ts'
import { MessageFilters } from './message-filters.tsx'
import { messageQueries } from './message-queries.ts'
import { MessageRow } from './message-row.tsx'

const settleMs = 200

function ListSkeleton() {
  return (
    <div role="status" aria-label="Loading the messages" className="space-y-2">
      <Skeleton className="h-16" />
      <Skeleton className="h-16" />
      <Skeleton className="h-16" />
      <Skeleton className="h-16" />
    </div>
  )
}

function NoMessages({ isFiltered, onClear }: { isFiltered: boolean; onClear: () => void }) {
  if (!isFiltered) {
    return (
      <EmptyState title="No messages yet">
        Make a booking firm: its crew is mailed on the working day before, and the mail shows here.
      </EmptyState>
    )
  }
  return (
    <EmptyState
      title="No message fits"
      action={
        <Button kind="plain" onClick={onClear}>
          Show all messages
        </Button>
      }
    >
      Try fewer words, another state or another kind.
    </EmptyState>
  )
}

function FakeMailNote() {
  return (
    <div className="mb-4">
      <Note kind="caution" title="Nobody receives this mail yet">
        <p>
          It goes to the local fake: you read it here, and each mail is a file in the folder{' '}
          <code className="font-semibold">fake-mail</code> beside the data. Set{' '}
          <code className="font-semibold">SMTP_URL</code> and start again to send it for real.
        </p>
      </Note>
    </div>
  )
}

/** Every mail there is, with its state; one opens beside the list at its own address. */
export function MessagesPage() {
  const { firm } = useSession()
  const { filter, change, isFiltered, search } = useMessageAddress()
  const list = useInfiniteQuery(
    messageQueries.list({ ...filter, q: useSettled(filter.q, settleMs) }),
  )
  const messages = list.data?.pages.flatMap((page) => page.messages) ?? []
  return (
    <>
      <PageHeader
        title="Messages"
        lead="What the crews were told, and whether it has gone out. Newest first."
      />
      {list.data?.pages[0]?.fakeMail ? <FakeMailNote /> : null}
      <MessageFilters filter={filter} change={change} isFiltered={isFiltered} />
      {list.isPending ? <ListSkeleton /> : null}
      {list.error ? (
        <ErrorState message={failureText(list.error) ?? ''} onRetry={() => void list.refetch()} />
      ) : null}
      {list.data && messages.length === 0 ? (
        <NoMessages
          isFiltered={isFiltered}
          onClear={() => change({ q: '', state: null, kind: null })}
        />
      ) : null}
      <ul className="space-y-2" aria-busy={list.isFetching}>
        {messages.map((message) => (
          <MessageRow key={message.id} message={message} timeZone={firm.timeZone} search={search} />
        ))}
      </ul>
      {list.hasNextPage ? (
        <Button
          kind="plain"
          className="mt-4"
          busy={list.isFetchingNextPage}
          onClick={() => void list.fetchNextPage()}
        >
          Show older messages
        </Button>
      ) : null}
      <Outlet />
    </>
  )
}
