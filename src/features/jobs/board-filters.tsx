import { X } from 'lucide-react'
import { jobStageNames, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { Board } from '../../../shared/jobs/job-views.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { SearchBox } from '../../ui/search-box.tsx'
import type { BoardFilter } from './job-queries.ts'

type Props = {
  filter: BoardFilter
  change: (next: Partial<BoardFilter>) => void
  isFiltered: boolean
  board: Board | undefined
}

export function BoardFilters({ filter, change, isFiltered, board }: Props) {
  const crews = board?.crews ?? []
  return (
    <search className="mb-4 grid grid-cols-2 items-end gap-3 lg:flex">
      <SearchBox
        className="col-span-2 lg:w-80"
        label="Find a job"
        placeholder="Number, title, site or name"
        maxLength={80}
        value={filter.q}
        onChange={(q) => change({ q })}
      />
      <Field label="Stage" className="lg:w-44">
        <Select
          value={filter.stage ?? ''}
          onChange={(event) =>
            change({ stage: jobStages.find((stage) => stage === event.target.value) ?? null })
          }
        >
          <option value="">All stages</option>
          {jobStages.map((stage) => (
            <option key={stage} value={stage}>
              {jobStageNames[stage]}
              {board ? ` (${board.counts[stage]})` : ''}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Crew" className="lg:w-44">
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
      {isFiltered ? (
        <Button
          kind="quiet"
          className="col-span-2 justify-self-start"
          onClick={() => change({ q: '', stage: null, crew: null })}
        >
          <X size={18} aria-hidden />
          Show all jobs
        </Button>
      ) : null}
    </search>
  )
}
