import { useSearchParams } from 'react-router-dom'
import { messageKinds, messageStates } from '../../../shared/messages/message-words.ts'
import type { MessageFilter } from './message-queries.ts'

/** Search and filters live in the address, so that a view can be kept and sent. */
export function useMessageAddress() {
  const [params, setParams] = useSearchParams()
  const filter: MessageFilter = {
    q: params.get('q') ?? '',
    state: messageStates.find((state) => state === params.get('state')) ?? null,
    kind: messageKinds.find((kind) => kind === params.get('kind')) ?? null,
  }
  const change = (next: Partial<MessageFilter>) => {
    const entries = Object.entries({ ...filter, ...next }).filter(
      (entry): entry is [string, string] => Boolean(entry[1]),
    )
    // At once, or the caret jumps while typing.
    setParams(entries, { replace: true, flushSync: true })
  }
  const isFiltered = filter.q !== '' || filter.state !== null || filter.kind !== null
  return { filter, change, isFiltered, search: params.toString() }
}
