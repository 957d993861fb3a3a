import { Link } from 'react-router-dom'
import type { Message } from '../../../shared/messages/message-schemas.ts'
import { kindWords } from '../../../shared/messages/message-words.ts'
import { MessageStateBadge } from './message-state-badge.tsx'
import { messageTitle, momentWords } from './message-times.ts'

type Props = { message: Message; timeZone: string; search: string }

export function MessageRow({ message, timeZone, search }: Props) {
  return (
    <li>
      <Link
        to={{ pathname: `/messages/${message.id}`, search }}
        className="grid min-h-14 items-center gap-x-4 gap-y-1 rounded-md border border-rule bg-sheet px-3 py-2 hover:border-ink-soft lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)_minmax(0,14rem)_9rem]"
      >
        <span className="min-w-0">
          <span className="block font-semibold [overflow-wrap:anywhere]">
            {messageTitle(message)}
          </span>
          <span className="block text-sm text-ink-soft">{kindWords[message.kind]}</span>
        </span>
        <span className="min-w-0">
          <span className="block [overflow-wrap:anywhere]">{message.toName}</span>
          <span className="block text-sm text-ink-soft [overflow-wrap:anywhere]">
            {message.toEmail}
          </span>
        </span>
        <span>
          <MessageStateBadge state={message.state} lastError={message.lastError} />
        </span>
        <span className="text-sm tabular-nums text-ink-soft lg:text-right">
          {momentWords(message.sentAt ?? message.createdAt, timeZone)}
        </span>
      </Link>
    </li>
  )
}
