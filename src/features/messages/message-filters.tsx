import { Search, X } from 'lucide-react'
import {
  kindWords,
  messageKinds,
  messageStates,
  stateWords,
} from '../../../shared/messages/message-words.ts'
import { useSearchKey } from '../../lib/use-search-key.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import type { MessageFilter } from './message-queries.ts'

type Props = {
  filter: MessageFilter
  change: (next: Partial<MessageFilter>) => void
  isFiltered: boolean
}

export function MessageFilters({ filter, change, isFiltered }: Props) {
  const input = useSearchKey()
  return (
    <search className="mb-4 grid grid-cols-2 items-end gap-3 lg:flex">
      <div className="relative col-span-2 lg:w-80">
        <label htmlFor="message-search" className="mb-1 block font-semibold">
          Find a message
        </label>
        <Search size={18} aria-hidden className="absolute bottom-3.5 left-3 text-ink-soft" />
        <TextInput
          ref={input}
          id="message-search"
          type="search"
          className="pl-9"
          placeholder="Name, address or subject"
          aria-keyshortcuts="/"
          maxLength={100}
          value={filter.q}
          onChange={(event) => change({ q: event.target.value })}
        />
      </div>
      <Field label="State" className="lg:w-48">
        <Select
          value={filter.state ?? ''}
          onChange={(event) =>
            change({ state: messageStates.find((state) => state === event.target.value) ?? null })
          }
        >
          <option value="">All states</option>
          {messageStates.map((state) => (
            <option key={state} value={state}>
              {stateWords(state)}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Kind" className="lg:w-48">
        <Select
          value={filter.kind ?? ''}
          onChange={(event) =>
            change({ kind: messageKinds.find((kind) => kind === event.target.value) ?? null })
          }
        >
          <option value="">All kinds</option>
          {messageKinds.map((kind) => (
            <option key={kind} value={kind}>
              {kindWords[kind]}
            </option>
          ))}
        </Select>
      </Field>
      {isFiltered ? (
        <Button
          kind="quiet"
          className="col-span-2 justify-self-start"
          onClick={() => change({ q: '', state: null, kind: null })}
        >
          <X size={18} aria-hidden />
          Show all messages
        </Button>
      ) : null}
    </search>
  )
}
