import { useQuery } from '@tanstack/react-query'
import { MessageSquare } from 'lucide-react'
import { useState } from 'react'
import { useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { MessageDetail } from '../../../shared/messages/message-schemas.ts'
import { kindWords } from '../../../shared/messages/message-words.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useMay, useSession } from '../../lib/session.ts'
import { smsHref } from '../../lib/sms-link.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState, Note } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { messageQueries, useTryAgain } from './message-queries.ts'
import { MessageStateBadge } from './message-state-badge.tsx'
import { messageTitle, momentWords } from './message-times.ts'

function Facts({ message, timeZone }: { message: MessageDetail; timeZone: string }) {
  const facts: [string, string | null][] = [
    ['To', `${message.toName}, ${message.toEmail}`],
    ['Kind', kindWords[message.kind]],
    ['Put in line', momentWords(message.createdAt, timeZone)],
    ['Sent', message.sentAt && momentWords(message.sentAt, timeZone)],
    ['Next try', message.nextTryAt && momentWords(message.nextTryAt, timeZone)],
    ['Tries', message.attempts > 1 ? String(message.attempts) : null],
  ]
  return (
    <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1">
      {facts.map(([label, value]) =>
        value === null ? null : (
          <div key={label} className="contents">
            <dt className="text-ink-soft">{label}</dt>
            <dd className="[overflow-wrap:anywhere]">{value}</dd>
          </div>
        ),
      )}
    </dl>
  )
}

function WhatHappened({ message }: { message: MessageDetail }) {
  if (message.state === 'maybe-twice') {
    return (
      <Note kind="caution" title="It may have arrived twice">
        The server stopped, or the line broke, while this mail was on its way, so it was sent once
        more.
      </Note>
    )
  }
  if (message.lastError === null) return null
  const isStop = message.state === 'failed'
  const title = isStop ? 'It could not be sent' : 'Why it has not gone out'
  return (
    <Note kind={isStop ? 'stop' : 'caution'} title={title}>
      <p className="[overflow-wrap:anywhere]">{message.lastError}</p>
    </Note>
  )
}

function Actions({ message }: { message: MessageDetail }) {
  const mayWrite = useMay('message:write')
  const tryAgain = useTryAgain()
  const toast = useToast()
  const retry = () =>
    tryAgain.mutate(message.id, { onSuccess: () => toast('It is back in line and goes out next.') })
  return (
    <>
      <div className="flex flex-wrap gap-2">
        {mayWrite && message.mayRetry ? (
          <Button busy={tryAgain.isPending} onClick={retry}>
            Try again
          </Button>
        ) : null}
        {message.textIt ? (
          <a href={smsHref(message.textIt)} className={buttonClass('plain')}>
            <MessageSquare size={20} aria-hidden />
            Text it
          </a>
        ) : null}
      </div>
      {tryAgain.error ? <ErrorState message={failureText(tryAgain.error) ?? ''} /> : null}
    </>
  )
}

const parts = [
  { value: 'text', label: 'Plain text' },
  { value: 'html', label: 'As it looks' },
] as const

function Words({ message }: { message: MessageDetail }) {
  const [part, setPart] = useState<'html' | 'text'>('text')
  if (message.text === null || message.html === null) {
    return (
      <p className="text-ink-soft">
        Its text is written when it is sent, so that it says what is true then.
      </p>
    )
  }
  return (
    <div className="flex min-h-0 grow flex-col gap-3">
      <div>
        <Segmented label="Part of the mail" options={parts} value={part} onChange={setPart} />
      </div>
      {part === 'html' ? (
        <iframe
          title="The mail as a mail program shows it"
          sandbox=""
          srcDoc={message.html}
          className="min-h-[26rem] w-full grow rounded-md border border-rule bg-sheet"
        />
      ) : (
        <pre className="whitespace-pre-wrap rounded-md border border-rule bg-paper p-3 font-sans text-base [overflow-wrap:anywhere]">
          {message.text}
        </pre>
      )}
    </div>
  )
}

function MessageBody({ message }: { message: MessageDetail }) {
  const { firm } = useSession()
  return (
    <div className="flex min-h-[calc(100dvh-8rem)] flex-col gap-4">
      <div>
        <MessageStateBadge state={message.state} lastError={message.lastError} />
      </div>
      <Facts message={message} timeZone={firm.timeZone} />
      <WhatHappened message={message} />
      <Actions message={message} />
      <Words message={message} />
    </div>
  )
}

/** One message, word for word, at its own address. */
export function MessagePanel() {
  const { messageId = '' } = useParams()
  const [params] = useSearchParams()
  const navigate = useNavigate()
  const message = useQuery(messageQueries.detail(messageId))
  const close = () => void navigate({ pathname: '/messages', search: params.toString() })
  const title = message.data ? messageTitle(message.data) : 'Message'
  return (
    <Dialog open onClose={close} title={title} place="panel">
      {message.isPending ? <PageSkeleton /> : null}
      {message.error ? (
        <ErrorState
          message={failureText(message.error) ?? ''}
          onRetry={() => void message.refetch()}
        />
      ) : null}
      {message.data ? <MessageBody message={message.data} /> : null}
    </Dialog>
  )
}
