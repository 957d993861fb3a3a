import type { ClashList } from '../../../shared/clashes/clash-list-schemas.ts'
import { clashCodes } from '../../../shared/clashes/clash-schemas.ts'
import { clashShortWords } from '../../../shared/clashes/clash-words.ts'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { SearchBox } from '../../ui/search-box.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { clashChoices, type ClashFilter } from './clash-view.ts'

const weights = [
  { value: 'all', label: 'All' },
  { value: 'clash', label: 'Clashes' },
  { value: 'caution', label: 'Cautions' },
] as const

type Props = {
  list: ClashList
  filter: ClashFilter
  change: (changes: Partial<ClashFilter>) => void
}

export function ClashFilters({ list, filter, change }: Props) {
  const { codes, crews } = clashChoices(list)
  return (
    <search className="grid grid-cols-2 items-end gap-3">
      <SearchBox
        className="col-span-2"
        label="Find a job"
        placeholder="Number or name"
        maxLength={80}
        value={filter.q}
        onChange={(q) => change({ q })}
      />
      <div className="col-span-2">
        <Segmented
          label="Weight"
          options={weights}
          value={filter.weight ?? 'all'}
          onChange={(weight) => change({ weight: weight === 'all' ? null : weight })}
        />
      </div>
      <Field label="What">
        <Select
          value={filter.what ?? ''}
          onChange={(event) =>
            change({ what: clashCodes.find((code) => code === event.target.value) ?? null })
          }
        >
          <option value="">Everything</option>
          {codes.map((code) => (
            <option key={code} value={code}>
              {clashShortWords[code]}
            </option>
          ))}
        </Select>
      </Field>
      {crews.length > 1 ? (
        <Field label="Crew">
          <Select
            value={filter.crew ?? ''}
            onChange={(event) => change({ crew: event.target.value || null })}
          >
            <option value="">All crews</option>
            {crews.map((crew) => (
              <option key={crew.id} value={crew.id}>
                {crew.name}
              </option>
            ))}
          </Select>
        </Field>
      ) : null}
    </search>
  )
}
