import { type QueryClient, useQueryClient } from '@tanstack/react-query'
import { useEffect } from 'react'
import { type LiveEvent, liveEventSchema } from '../../shared/events/live-event.ts'

/** First part of the query keys that a topic makes stale; a feature's `all()` key is its topic. */
const keysByTopic: Record<LiveEvent['topic'], readonly string[]> = {
  jobs: ['jobs', 'calendar', 'day-sheet', 'notices'],
  roof: ['roof', 'jobs', 'calendar', 'day-sheet', 'notices'],
  calendar: ['calendar', 'jobs', 'day-sheet', 'notices'],
  'day-sheet': ['day-sheet', 'calendar'],
  messages: ['messages', 'notices'],
  people: ['people', 'calendar', 'day-sheet', 'notices'],
  firm: ['firm', 'session', 'calendar', 'day-sheet', 'notices'],
}

function refresh(client: QueryClient, topic: LiveEvent['topic']): void {
  for (const key of keysByTopic[topic]) void client.invalidateQueries({ queryKey: [key] })
}

/** Keeps every open screen up to date with what others do. */
export function useLiveEvents(): void {
  const client = useQueryClient()
  useEffect(() => {
    let wasLost = false
    let source = open()
    function open(): EventSource {
      const opened = new EventSource('/api/events')
      opened.onmessage = (message: MessageEvent<string>) => {
        const parsed = liveEventSchema.safeParse(JSON.parse(message.data))
        if (parsed.success) refresh(client, parsed.data.topic)
      }
      opened.onerror = () => {
        wasLost = true
      }
      opened.onopen = () => {
        // What happened while the line was down was not heard.
        if (wasLost) void client.invalidateQueries()
        wasLost = false
      }
      // Newer tabs took its place; it listens again once somebody looks at it.
      opened.addEventListener('superseded', () => {
        opened.close()
        wasLost = true
        document.addEventListener('visibilitychange', lookedAt)
      })
      return opened
    }
    function lookedAt(): void {
      if (document.visibilityState !== 'visible') return
      document.removeEventListener('visibilitychange', lookedAt)
      source = open()
    }
    return () => {
      document.removeEventListener('visibilitychange', lookedAt)
      source.close()
    }
  }, [client])
}
