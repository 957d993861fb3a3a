import { useSearchParams } from 'react-router-dom'
import { type JobStage, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { BoardFilter } from './job-queries.ts'

function stageOf(text: string | null): JobStage | null {
  return jobStages.find((stage) => stage === text) ?? null
}

/** Columns by stage, or one table. */
export type BoardView = 'stages' | 'table'

/** The board's search and filters live in the address, so that a view can be kept and sent. */
export function useBoardAddress() {
  const [params, setParams] = useSearchParams()
  const filter: BoardFilter = {
    q: params.get('q') ?? '',
    stage: stageOf(params.get('stage')),
    crew: params.get('crew'),
  }
  const view: BoardView = params.get('view') === 'table' ? 'table' : 'stages'
  const sort = params.get('sort') ?? ''
  const change = (next: Partial<BoardFilter & { view: BoardView; sort: string }>) => {
    const { view: nextView = view, sort: nextSort = sort, ...rest } = next
    const merged = {
      ...filter,
      ...rest,
      view: nextView === 'table' ? 'table' : null,
      sort: nextSort,
    }
    const entries = Object.entries(merged).filter((entry): entry is [string, string] =>
      Boolean(entry[1]),
    )
    // At once, or the caret jumps while typing.
    setParams(entries, { replace: true, flushSync: true })
  }
  const isFiltered = filter.q !== '' || filter.stage !== null || filter.crew !== null
  return { filter, view, sort, change, isFiltered }
}
