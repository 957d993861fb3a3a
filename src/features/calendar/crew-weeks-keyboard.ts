import type { CollisionDetection, KeyboardCoordinateGetter } from '@dnd-kit/core'
import { pointerWithin } from '@dnd-kit/core'
import type { Day } from '../../../shared/calendar/days.ts'

export const cellId = (crewId: string, day: Day): string => `cell ${crewId} ${day}`

const insetPx = 8

/** The cell under the pointer; by keys, the cell at the top left of what is in hand. */
export const cellInReach: CollisionDetection = (args) => {
  if (args.pointerCoordinates) return pointerWithin(args)
  const { left, top } = args.collisionRect
  return pointerWithin({ ...args, pointerCoordinates: { x: left + insetPx, y: top + insetPx } })
}

const steps: Record<string, { crews: number; days: number }> = {
  ArrowLeft: { crews: 0, days: -1 },
  ArrowRight: { crews: 0, days: 1 },
  ArrowUp: { crews: -1, days: 0 },
  ArrowDown: { crews: 1, days: 0 },
}

type Grid = { crewIds: readonly string[]; days: readonly Day[]; firstDay: Day }

/** Arrows carry what is in hand from cell to cell; from outside the grid, to its first open day. */
export function keyboardOver(grid: Grid): KeyboardCoordinateGetter {
  const { crewIds, days, firstDay } = grid
  return (event, { context }) => {
    const step = steps[event.code]
    if (!step) return undefined
    event.preventDefault()
    const at: unknown = context.over?.data.current
    const cell = isCell(at) ? at : null
    const crewAt = cell ? crewIds.indexOf(cell.crewId) + step.crews : 0
    const dayAt = cell ? days.indexOf(cell.day) + step.days : days.indexOf(firstDay)
    const [crewId, day] = [crewIds[crewAt], days[dayAt]]
    if (crewId === undefined || day === undefined) return undefined
    const rect = context.droppableRects.get(cellId(crewId, day))
    return rect ? { x: rect.left, y: rect.top } : undefined
  }
}

export function isCell(data: unknown): data is { crewId: string; day: Day } {
  return typeof data === 'object' && data !== null && 'crewId' in data && 'day' in data
}
