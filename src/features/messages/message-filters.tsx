import { X } from 'lucide-react'
import {
  kindWords,
  messageKinds,
  messageStates,
  stateWords,
} from '../../../shared/messages/message-words.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { SearchBox } from '../../ui/search-box.tsx'
import type { MessageFilter } from './message-queries.ts'

type Props = {
  filter: MessageFilter
  change: (next: Partial<MessageFilter>) => void
  isFiltered: boolean
}

export function MessageFilters({ filter, change, isFiltered }: Props) {
  return (
    <search className="mb-4 grid grid-cols-2 items-end gap-3 lg:flex">
      <SearchBox
        className="col-span-2 lg:w-80"
        label="Find a message"
        placeholder="Name, address or subject"
        maxLength={100}
        value={filter.q}
        onChange={(q) => change({ q })}
      />
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
