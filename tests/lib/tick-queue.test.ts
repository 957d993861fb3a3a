import { expect, test, vi } from 'vitest'
import { createTickQueue, type PendingTick, type TickOutcome } from '../../src/lib/tick-queue.ts'
import { withTask } from '../../src/lib/use-ticks.ts'
import type { DayTask } from '../../shared/day-sheets/task-schemas.ts'

function memory(): Pick<Storage, 'getItem' | 'setItem'> & { kept: Map<string, string> } {
  const kept = new Map<string, string>()
  return {
    kept,
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, value) => void kept.set(key, value),
  }
}

const tick = (id: string, delta: 1 | -1 = 1): PendingTick => ({ id, taskId: 'task', delta })

function phone(answers: TickOutcome[], storage = memory()) {
  const sent: string[] = []
  const send = async ({ id }: PendingTick): Promise<TickOutcome> => {
    sent.push(id)
    return answers.shift() ?? 'sent'
  }
  const queue = createTickQueue({ key: 'ticks', storage, send, waitMs: () => 1 })
  return { queue, sent, storage }
}

test('two quick taps are two ticks, sent in their order', async () => {
  const { queue, sent } = phone([])
  queue.add(tick('a'))
  queue.add(tick('b'))
  await vi.waitFor(() => expect(queue.snapshot()).toEqual([]))
  expect(sent).toEqual(['a', 'b'])
})

test('a tick without signal is kept and sent again under the same id', async () => {
  const { queue, sent } = phone(['later', 'later'])
  queue.add(tick('a'))
  expect(queue.snapshot()).toHaveLength(1)
  await vi.waitFor(() => expect(queue.snapshot()).toEqual([]))
  expect(sent).toEqual(['a', 'a', 'a'])
})

test('a tick that was not sent is still there when the page is opened again', async () => {
  const storage = memory()
  const before = createTickQueue({
    key: 'ticks',
    storage,
    send: async () => 'later',
    waitMs: () => 60_000,
  })
  before.add(tick('a'))
  const { queue, sent } = phone([], storage)
  expect(queue.snapshot()).toEqual([tick('a')])
  queue.flush()
  await vi.waitFor(() => expect(queue.snapshot()).toEqual([]))
  expect(sent).toEqual(['a'])
  expect(storage.kept.get('ticks')).toBe('[]')
})

test('a refused tick is dropped and the next one still goes', async () => {
  const { queue, sent } = phone(['refused'])
  queue.add(tick('a'))
  queue.add(tick('b', -1))
  await vi.waitFor(() => expect(queue.snapshot()).toEqual([]))
  expect(sent).toEqual(['a', 'b'])
})

test('what is unreadable in storage is set aside, not fatal', () => {
  const storage = memory()
  storage.kept.set('ticks', '{"not": "a list"}')
  expect(phone([], storage).queue.snapshot()).toEqual([])
  storage.kept.set('ticks', 'no json')
  expect(phone([], storage).queue.snapshot()).toEqual([])
})

test('an answered task takes its place on every screen that shows it', () => {
  const was = { id: 'a', doneCount: 1, version: 1 }
  const now = { id: 'a', doneCount: 2, version: 1 } as DayTask
  const other = { id: 'b', doneCount: 0, version: 1 }
  expect(withTask({ sheets: [{ tasks: [was, other] }], day: 'x' }, now)).toEqual({
    sheets: [{ tasks: [now, other] }],
    day: 'x',
  })
  expect(withTask({ task: was, card: null }, now)).toEqual({ task: now, card: null })
})
