import { type QueryClient, useQueryClient } from '@tanstack/react-query'
import { useEffect, useSyncExternalStore } from 'react'
import { z } from 'zod'
import { type DayTask, taskAnswerSchema } from '../../shared/day-sheets/task-schemas.ts'
import { useToast } from '../ui/toast.tsx'
import { api, ApiFailure } from './api-client.ts'
import { newDeviceId } from './device-id.ts'
import { useUser } from './session.ts'
import {
  createTickQueue,
  type PendingTick,
  type TickOutcome,
  type TickQueue,
} from './tick-queue.ts'

type Tell = (text: string) => void
type Shared = { queue: TickQueue; tellWith: (tell: Tell) => void }

/** One queue a person and page, so that all screens show the same unsent ticks. */
const queues = new Map<string, Shared>()

const taskSchema = z.looseObject({ id: z.string(), doneCount: z.number(), version: z.number() })

/** The same data with one task as the server has it now, wherever it stands. */
export function withTask(data: unknown, task: DayTask): unknown {
  if (Array.isArray(data)) return data.map((item) => withTask(item, task))
  if (typeof data !== 'object' || data === null) return data
  const found = taskSchema.safeParse(data)
  if (found.success && found.data.id === task.id) return task
  return Object.fromEntries(
    Object.entries(data).map(([key, value]) => [key, withTask(value, task)]),
  )
}

async function sendTick(client: QueryClient, tell: Tell, tick: PendingTick): Promise<TickOutcome> {
  try {
    const body = { id: tick.id, delta: tick.delta }
    const { task } = await api.post(`/api/tasks/${tick.taskId}/ticks`, taskAnswerSchema, body)
    client.setQueriesData({ queryKey: ['day-sheet'] }, (data: unknown) => withTask(data, task))
    return 'sent'
  } catch (error) {
    const isRefused = error instanceof ApiFailure && [400, 403, 404, 409].includes(error.status)
    if (!isRefused) return 'later'
    tell(error.message)
    void client.invalidateQueries({ queryKey: ['day-sheet'] })
    return 'refused'
  }
}

function queueOf(userId: string, client: QueryClient): Shared {
  const known = queues.get(userId)
  if (known) return known
  let tell: Tell = () => undefined
  const queue = createTickQueue({
    key: `ridgehand.ticks.${userId}`,
    storage: window.localStorage,
    send: (tick) => sendTick(client, (text) => tell(text), tick),
  })
  const tellWith = (next: Tell) => {
    tell = next
  }
  const shared = { queue, tellWith }
  queues.set(userId, shared)
  window.addEventListener('online', () => queue.flush())
  queue.flush()
  return shared
}

/** The ticks of one task: its count with what this device has not sent yet, and a way to add one. */
export function useTicks(task: Pick<DayTask, 'id' | 'doneCount' | 'quantity'>) {
  const user = useUser()
  const client = useQueryClient()
  const toast = useToast()
  const { queue, tellWith } = queueOf(user.id, client)
  useEffect(() => {
    tellWith((text) => toast(text, { kind: 'stop' }))
  }, [tellWith, toast])
  const pending = useSyncExternalStore(queue.subscribe, queue.snapshot)
  const own = pending.filter((tick) => tick.taskId === task.id)
  const sum = own.reduce((total, tick) => total + tick.delta, 0)
  const count = Math.max(0, Math.min(task.quantity, task.doneCount + sum))
  return {
    count,
    unsent: own.length,
    step(delta: 1 | -1) {
      // Asked of the queue itself: two taps may come before a screen is drawn again.
      const queued = queue.snapshot().filter((tick) => tick.taskId === task.id)
      const next = task.doneCount + queued.reduce((total, tick) => total + tick.delta, 0) + delta
      if (next < 0 || next > task.quantity) return
      queue.add({ id: newDeviceId(), taskId: task.id, delta })
    },
  }
}
