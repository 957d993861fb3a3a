import { useSearchParams } from 'react-router-dom'
import { type JobStage, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { BoardFilter } from './job-queries.ts'

function stageOf(text: string | null): JobStage | null {
  return jobStages.find((stage) => stage === text) ?? null
}

/** The board's search and filters live in the address, so that a view can be kept and sent. */
export function useBoardAddress() {
  const [params, setParams] = useSearchParams()
  const filter: BoardFilter = {
    q: params.get('q') ?? '',
    stage: stageOf(params.get('stage')),
    crew: params.get('crew'),
  }
  const change = (next: Partial<BoardFilter>) => {
    const merged = { ...filter, ...next }
    const entries = Object.entries(merged).filter((entry): entry is [string, string] =>
      Boolean(entry[1]),
    )
    // At once, or the caret jumps while typing.
    setParams(entries, { replace: true, flushSync: true })
  }
  const isFiltered = filter.q !== '' || filter.stage !== null || filter.crew !== null
  return { filter, change, isFiltered }
}
