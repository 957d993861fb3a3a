import type { Request } from 'express'
import { currentUser } from '../auth/current-user.ts'
import type { Api } from '../http/api.ts'
import type { EventHub } from './event-hub.ts'
import { createOpenStreams } from './open-streams.ts'

const heartbeatMs = 25_000

/**
 * Server-sent events; the browser reconnects by itself. Before each word the session is looked at again: an
 * ended one hears nothing more, and its stream is closed.
 */
export function eventRoutes(
  api: Api,
  hub: EventHub,
  isStillSignedIn: (req: Request) => Promise<boolean>,
): void {
  const streams = createOpenStreams()
  api.route('get', '/api/events', 'event:read', (req, res) => {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream',
      'Cache-Control': 'no-store',
      Connection: 'keep-alive',
      'X-Accel-Buffering': 'no',
    })
    res.write('retry: 2000\n\n')
    const personId = currentUser(res).id
    streams.add(personId, res)
    const say = (text: string): void => {
      if (res.writableEnded) return
      isStillSignedIn(req).then(
        (holds) => {
          if (res.writableEnded) return
          if (holds) res.write(text)
          else res.end()
        },
        () => res.end(),
      )
    }
    const unsubscribe = hub.subscribe((event) => say(`data: ${JSON.stringify(event)}\n\n`))
    const heartbeat = setInterval(() => say(': still here\n\n'), heartbeatMs)
    res.on('close', () => {
      clearInterval(heartbeat)
      unsubscribe()
      streams.remove(personId, res)
    })
  })
}
