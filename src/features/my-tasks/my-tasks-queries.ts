import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import {
  myTasksSchema,
  taskAnswerSchema,
  taskDetailSchema,
} from '../../../shared/day-sheets/task-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const myTasksQueries = {
  all: () => ['day-sheet'] as const,
  ofDay: (day: string | null) =>
    queryOptions({
      queryKey: [...myTasksQueries.all(), 'my-tasks', day] as const,
      queryFn: ({ signal }) =>
        api.get(day ? `/api/my-tasks?day=${day}` : '/api/my-tasks', myTasksSchema, { signal }),
      placeholderData: keepPreviousData,
    }),
  detail: (taskId: string) =>
    queryOptions({
      queryKey: [...myTasksQueries.all(), 'task', taskId] as const,
      queryFn: ({ signal }) => api.get(`/api/tasks/${taskId}`, taskDetailSchema, { signal }),
    }),
}

export function raiseHand(taskId: string, raised: boolean) {
  return api.post(`/api/tasks/${taskId}/hand`, taskAnswerSchema, { raised })
}
