import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { ChangeTask, DayTask } from '../../../shared/day-sheets/task-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { withTask } from '../../lib/use-ticks.ts'
import { useToast } from '../../ui/toast.tsx'
import { changeTask, raiseHand, todayQueries } from './today-queries.ts'

/** Hands out, moves and checks off one task; a refusal says why and shows what is there now. */
export function useTaskChange(task: DayTask) {
  const client = useQueryClient()
  const toast = useToast()
  const queryKey = todayQueries.all()
  const handlers = {
    onSuccess: (answer: { task: DayTask }) => {
      client.setQueriesData({ queryKey }, (data: unknown) => withTask(data, answer.task))
    },
    onError: (error: unknown) => toast(failureText(error) ?? '', { kind: 'stop' }),
    onSettled: () => client.invalidateQueries({ queryKey }),
  }
  const change = useMutation({
    mutationFn: (what: Omit<ChangeTask, 'version'>) =>
      changeTask(task.id, { ...what, version: task.version }),
    ...handlers,
  })
  const hand = useMutation({
    mutationFn: (raised: boolean) => raiseHand(task.id, raised),
    ...handlers,
  })
  return { change, hand }
}
