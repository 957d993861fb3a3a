import { Ban, Check, CheckCheck, CircleAlert, Clock, type LucideIcon, Send } from 'lucide-react'
import type { ComponentProps } from 'react'
import { type MessageState, messageStateWords } from '../../../shared/messages/message-words.ts'
import { Badge } from '../../ui/badge.tsx'

type Look = { kind: ComponentProps<typeof Badge>['kind']; icon: LucideIcon }

const looks: Record<MessageState, Look> = {
  waiting: { kind: 'ochre', icon: Clock },
  sending: { kind: 'chalk', icon: Send },
  sent: { kind: 'leaf', icon: Check },
  'maybe-twice': { kind: 'ochre', icon: CheckCheck },
  failed: { kind: 'stop', icon: CircleAlert },
  dropped: { kind: 'plain', icon: Ban },
}

export function MessageStateBadge({
  state,
  lastError,
}: {
  state: MessageState
  lastError: string | null
}) {
  const { kind, icon: Icon } = looks[state]
  return (
    <Badge kind={kind ?? 'plain'}>
      <Icon size={16} aria-hidden />
      {messageStateWords(state, lastError)}
    </Badge>
  )
}
