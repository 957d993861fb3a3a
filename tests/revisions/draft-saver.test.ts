import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import type { RoofForm } from '../../shared/revisions/roof-form.ts'
import { createDraftSaver } from '../../src/features/roof-editor/draft-saver.ts'
import { formHistoryReducer, historyOf } from '../../src/features/roof-editor/form-history.ts'
import { ApiFailure } from '../../src/lib/api-client.ts'
import { typedForm } from './typed-form.ts'

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

const pitched = (pitchDeg: string) => typedForm('rectangle', { pitchDeg })

function failure(status: number, current?: { form: RoofForm; version: number }): ApiFailure {
  const detail =
    status === 409
      ? {
          current: current
            ? { ...current, updatedAt: '2026-12-02T00:00:00.000Z', sizesTyped: {} }
            : null,
        }
      : undefined
  const code = status === 409 ? 'conflict' : 'internal'
  return new ApiFailure({ code, message: 'No answer.', requestId: 'r', issues: [], detail }, status)
}

/** A server that keeps the last form, with its failures in the test's hand. */
function standIn() {
  const server = { version: 1, form: pitched('20'), sent: [] as string[], fail: [] as ApiFailure[] }
  let kept: { form: RoofForm; version: number } | null = null
  const saver = createDraftSaver({
    version: 1,
    keep: (unsaved) => {
      kept = unsaved
    },
    send: async (form, version) => {
      await Promise.resolve()
      const failed = server.fail.shift()
      if (failed) throw failed
      if (version !== server.version) throw failure(409, server)
      server.sent.push(form.pitchDeg)
      server.form = form
      server.version += 1
      return { version: server.version }
    },
  })
  return { server, saver, kept: () => kept }
}

test('typing is saved once it pauses, the newest text only', async () => {
  const { server, saver, kept } = standIn()
  for (const pitch of ['2', '25', '25.5']) {
    saver.changed(pitched(pitch))
    expect(saver.state().kind).toBe('saving')
    await vi.advanceTimersByTimeAsync(200)
  }
  expect(kept()?.form.pitchDeg).toBe('25.5')
  await vi.advanceTimersByTimeAsync(1_000)
  expect(server.sent).toEqual(['25.5'])
  expect(saver.state().kind).toBe('saved')
  expect(kept()).toBeNull()
})

test('a lost line keeps what was typed and saves it by itself later', async () => {
  const { server, saver, kept } = standIn()
  server.fail.push(failure(0))
  saver.changed(pitched('25'))
  await vi.advanceTimersByTimeAsync(1_000)
  expect(saver.state()).toEqual({ kind: 'failed', message: 'No answer.' })
  expect(kept()?.form.pitchDeg).toBe('25')
  await vi.advanceTimersByTimeAsync(11_000)
  expect(saver.state().kind).toBe('saved')
  expect(server.sent).toEqual(['25'])
})

test('what was typed while a save was under way is saved after it', async () => {
  const { server, saver } = standIn()
  saver.changed(pitched('25'))
  const flushed = saver.flush()
  saver.changed(pitched('30'))
  expect(await flushed).toBe(3)
  expect(server.sent).toEqual(['25', '30'])
})

test('somebody else’s newer draft is a conflict, and nothing is sent until one is chosen', async () => {
  const { server, saver, kept } = standIn()
  server.version = 5
  saver.changed(pitched('25'))
  expect(await saver.flush()).toBeNull()
  expect(saver.state()).toMatchObject({ kind: 'conflict', current: { version: 5 } })
  saver.changed(pitched('26'))
  await vi.advanceTimersByTimeAsync(60_000)
  expect(server.sent).toEqual([])
  expect(kept()?.form.pitchDeg).toBe('26')
  saver.adopt(5, pitched('26'))
  await vi.advanceTimersByTimeAsync(0)
  expect(server.sent).toEqual(['26'])
  expect(saver.state().kind).toBe('saved')
})

test('a save that arrived although its answer was lost is no conflict', async () => {
  const { server, saver } = standIn()
  saver.changed(pitched('25'))
  server.fail.push(failure(0))
  await vi.advanceTimersByTimeAsync(1_000)
  server.version = 2
  server.form = pitched('25')
  expect(await saver.flush()).toBe(2)
  expect(saver.state().kind).toBe('saved')
})

test('keys in one field within a second are one undo, another field another', () => {
  const type = (path: string, text: string, atMs: number) =>
    ({ kind: 'text', path, text, atMs }) as const
  let history = historyOf(pitched('20'))
  for (const action of [
    type('pitchDeg', '2', 0),
    type('pitchDeg', '25', 300),
    type('widthMm', '700', 600),
    type('widthMm', '7000', 900),
    type('widthMm', '7100', 5_000),
  ]) {
    history = formHistoryReducer(history, action)
  }
  const texts = () => [history.now.pitchDeg, history.now.widthMm]
  const seen = [texts()]
  while (history.past.length > 0) {
    history = formHistoryReducer(history, { kind: 'undo' })
    seen.push(texts())
  }
  expect(seen).toEqual([
    ['25', '7100'],
    ['25', '7000'],
    ['25', '6000'],
    ['20', '6000'],
  ])
  history = formHistoryReducer(history, { kind: 'redo' })
  expect(texts()).toEqual(['25', '6000'])
})
